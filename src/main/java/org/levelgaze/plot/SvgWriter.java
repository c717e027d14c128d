package org.levelgaze.plot;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayDeque;
import java.util.Deque;

/** Writes well-formed SVG: every text escaped, every number finite and written the same in every language. */
final class SvgWriter {

    private final StringBuilder out = new StringBuilder(2048);
    private final Deque<String> open = new ArrayDeque<>();

    /** Opens an element; attributes come as name, value, name, value; a number as value must be finite. */
    SvgWriter open(String element, Object... attributes) {
        start(element, attributes);
        out.append('>');
        open.push(element);
        return this;
    }

    /** Closes the element opened last. */
    SvgWriter close() {
        out.append("</").append(open.pop()).append('>');
        return this;
    }

    /** An element without content. */
    SvgWriter leaf(String element, Object... attributes) {
        start(element, attributes);
        out.append("/>");
        return this;
    }

    /** An element that holds a text. */
    SvgWriter words(String element, String content, Object... attributes) {
        open(element, attributes);
        out.append(escaped(content));
        return close();
    }

    /** A line from one point to another. */
    SvgWriter line(double x1, double y1, double x2, double y2, Tone tone, double width) {
        return leaf(
                "line",
                "x1",
                x1,
                "y1",
                y1,
                "x2",
                x2,
                "y2",
                y2,
                "class",
                tone.line(),
                "stroke",
                tone.paper(),
                "stroke-width",
                width);
    }

    /** A dashed line from one point to another. */
    SvgWriter dashed(double x1, double y1, double x2, double y2, Tone tone) {
        return leaf(
                "line",
                "x1",
                x1,
                "y1",
                y1,
                "x2",
                x2,
                "y2",
                y2,
                "class",
                tone.line(),
                "stroke",
                tone.paper(),
                "stroke-width",
                1.25,
                "stroke-dasharray",
                "5 4");
    }

    /** A text whose anchor is {@code start}, {@code middle} or {@code end}. */
    SvgWriter text(String content, double x, double y, String anchor, double size, Tone tone) {
        return words(
                "text",
                content,
                "x",
                x,
                "y",
                y,
                "text-anchor",
                anchor,
                "font-size",
                size,
                "class",
                tone.fill(),
                "fill",
                tone.paper());
    }

    /** A text in the heavier weight. */
    SvgWriter heading(String content, double x, double y, String anchor, double size, Tone tone) {
        return words(
                "text",
                content,
                "x",
                x,
                "y",
                y,
                "text-anchor",
                anchor,
                "font-size",
                size,
                "font-weight",
                600,
                "class",
                tone.fill(),
                "fill",
                tone.paper());
    }

    /** A text that stays readable over lines: the paper shows around its letters. */
    SvgWriter over(String content, double x, double y, String anchor, double size, Tone tone) {
        words(
                "text",
                content,
                "x",
                x,
                "y",
                y,
                "text-anchor",
                anchor,
                "font-size",
                size,
                "aria-hidden",
                true,
                "class",
                Tone.PAPER.fill() + " " + Tone.PAPER.line(),
                "fill",
                Tone.PAPER.paper(),
                "stroke",
                Tone.PAPER.paper(),
                "stroke-width",
                4,
                "stroke-linejoin",
                "round");
        return text(content, x, y, anchor, size, tone);
    }

    /** A number as SVG takes it: at most two decimals, a point, no exponent. */
    static String number(double value) {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException("A picture has no place for " + value);
        }
        BigDecimal rounded =
                BigDecimal.valueOf(value).setScale(2, RoundingMode.HALF_UP).stripTrailingZeros();
        return rounded.signum() == 0 ? "0" : rounded.toPlainString();
    }

    /** A text as XML takes it, characters that XML has none for replaced. */
    static String escaped(String text) {
        StringBuilder safe = new StringBuilder(text.length() + 16);
        text.codePoints().forEach(c -> {
            switch (c) {
                case '&' -> safe.append("&amp;");
                case '<' -> safe.append("&lt;");
                case '>' -> safe.append("&gt;");
                case '"' -> safe.append("&quot;");
                default -> safe.appendCodePoint(isXml(c) ? c : 0xFFFD);
            }
        });
        return safe.toString();
    }

    /** The characters of XML 1.0, production 2. */
    private static boolean isXml(int c) {
        return c == 0x9
                || c == 0xA
                || c == 0xD
                || (c >= 0x20 && c <= 0xD7FF)
                || (c >= 0xE000 && c <= 0xFFFD)
                || c >= 0x10000;
    }

    private void start(String element, Object... attributes) {
        out.append('<').append(element);
        for (int i = 0; i < attributes.length; i += 2) {
            Object value = attributes[i + 1];
            String written = value instanceof Number number ? number(number.doubleValue()) : escaped(value.toString());
            out.append(' ').append(attributes[i]).append("=\"").append(written).append('"');
        }
    }

    /** What was written; every element must be closed. */
    @Override
    public String toString() {
        if (!open.isEmpty()) {
            throw new IllegalStateException("Not closed: " + open);
        }
        return out.toString();
    }
}
