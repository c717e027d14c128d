package org.levelgaze.plot;

import java.util.List;
import java.util.Locale;

/**
 * The lean scale: one horizontal line, strict at the left, lenient at the right, a mark at c and a bar for its
 * interval. It always runs from -2 to 2, so that marks in different rows can be compared; what lies beyond is drawn at
 * the end with an arrow. c is the criterion of signal detection in standard deviations, above 0 lenient (findings).
 */
public final class LeanScale {

    private static final double END = 2;

    private LeanScale() {}

    /**
     * Small, for a table row.
     *
     * @param title whose lean it is
     * @param c the criterion c and its interval
     * @param limits what the criteria ask, as ticks; empty for none
     */
    public static Picture row(String title, Estimate c, List<Double> limits, Drawing drawing) {
        Axis axis = new Axis(-END, END, 10, 170);
        SvgWriter svg = Canvas.open(drawing, "plot-lean-row", 180, 28, false, title, sentence(c, drawing));
        line(svg, axis, 14, limits);
        mark(svg, axis, 14, c, 5.5);
        svg.close();
        return picture(svg, c, drawing);
    }

    /**
     * Large, with what the two ends mean and the numbers.
     *
     * @param title whose lean it is
     * @param c the criterion c and its interval
     * @param limits what the criteria ask, as ticks; empty for none
     */
    public static Picture form(String title, Estimate c, List<Double> limits, Drawing drawing) {
        Axis axis = new Axis(-END, END, 20, 420);
        SvgWriter svg = Canvas.open(drawing, "plot-lean", 440, 124, false, title, sentence(c, drawing));
        svg.heading(drawing.text("plot.lean.strict"), 4, 16, "start", 15, Tone.STRICT);
        svg.heading(drawing.text("plot.lean.lenient"), 436, 16, "end", 15, Tone.LENIENT);
        svg.text(Canvas.cut(drawing.text("plot.lean.strict.means"), 212, 14), 4, 33, "start", 14, Tone.INK_SOFT);
        svg.text(Canvas.cut(drawing.text("plot.lean.lenient.means"), 212, 14), 436, 33, "end", 14, Tone.INK_SOFT);
        line(svg, axis, 80, limits);
        numbers(svg, axis, drawing);
        mark(svg, axis, 80, c, 8);
        double middle = c.value() == null ? axis.at(0) : axis.at(c.value());
        String label = c.value() == null ? drawing.text("plot.none") : "c " + written(c.value(), drawing.locale());
        svg.heading(label, Math.min(405, Math.max(35, middle)), 62, "middle", 15, Tone.INK);
        svg.close();
        return picture(svg, c, drawing);
    }

    private static String written(double c, Locale locale) {
        return Numerals.DECIMAL.of(c, locale);
    }

    private static void line(SvgWriter svg, Axis axis, double y, List<Double> limits) {
        svg.line(axis.start(), y, axis.end(), y, Tone.EDGE, 1.25);
        for (double tick = -END; tick <= END; tick++) {
            double half = tick == 0 ? 8 : 3;
            svg.line(axis.at(tick), y - half, axis.at(tick), y + half, tick == 0 ? Tone.INK : Tone.EDGE, 1.25);
        }
        for (double limit : limits) {
            svg.dashed(axis.at(limit), y - 11, axis.at(limit), y + 11, Tone.ACCENT);
        }
    }

    private static void numbers(SvgWriter svg, Axis axis, Drawing drawing) {
        for (double tick = -END; tick <= END; tick++) {
            String label = Numerals.SHORT.of(tick, drawing.locale());
            svg.text(label, axis.at(tick), 104, "middle", 13, Tone.INK_SOFT);
        }
        svg.text(drawing.text("plot.lean.even"), axis.at(0), 120, "middle", 14, Tone.INK_SOFT);
    }

    private static void mark(SvgWriter svg, Axis axis, double y, Estimate c, double radius) {
        if (c.value() == null) {
            return;
        }
        Tone tone = tone(c);
        if (c.low() != null && c.high() != null) {
            bar(svg, axis, y, c.low(), c.high(), radius, tone);
        }
        switch (tone) {
            case LENIENT -> Marks.lenient(svg, axis.at(c.value()), y, radius);
            case STRICT -> Marks.strict(svg, axis.at(c.value()), y, radius);
            default -> Marks.dot(svg, axis.at(c.value()), y, radius - 0.5, tone);
        }
    }

    private static void bar(SvgWriter svg, Axis axis, double y, double low, double high, double radius, Tone tone) {
        double left = axis.at(low);
        double right = axis.at(high);
        double half = radius * 0.6;
        svg.leaf(
                "rect",
                "x",
                left,
                "y",
                y - half,
                "width",
                right - left,
                "height",
                2 * half,
                "rx",
                1.5,
                "class",
                tone.fill() + " " + tone.line(),
                "fill",
                tone.paper(),
                "fill-opacity",
                0.25,
                "stroke",
                tone.paper(),
                "stroke-width",
                1.25);
        if (low < axis.from()) {
            arrow(svg, left, y, -half, tone);
        }
        if (high > axis.to()) {
            arrow(svg, right, y, half, tone);
        }
    }

    private static void arrow(SvgWriter svg, double x, double y, double reach, Tone tone) {
        double half = Math.abs(reach);
        svg.leaf(
                "path",
                "d",
                Marks.path("M", x, y - half, "L", x + 1.6 * reach, y, "L", x, y + half),
                "fill",
                "none",
                "class",
                tone.line(),
                "stroke",
                tone.paper(),
                "stroke-width",
                1.5);
    }

    /** Leaning is said only where the interval excludes 0 (findings: lean in words). */
    private static Tone tone(Estimate c) {
        if (c.isAbove(0)) {
            return Tone.LENIENT;
        }
        return c.isBelow(0) ? Tone.STRICT : Tone.EVEN;
    }

    private static String lean(Estimate c, Drawing drawing) {
        return switch (tone(c)) {
            case LENIENT -> drawing.text("plot.lean.lenient");
            case STRICT -> drawing.text("plot.lean.strict");
            default -> drawing.text("plot.lean.even.sofar");
        };
    }

    private static String sentence(Estimate c, Drawing drawing) {
        if (c.value() == null) {
            return drawing.text("plot.none");
        }
        String value = written(c.value(), drawing.locale());
        if (c.low() == null || c.high() == null) {
            return drawing.text("plot.lean.value", value);
        }
        return drawing.text(
                "plot.lean.sentence",
                value,
                written(c.low(), drawing.locale()),
                written(c.high(), drawing.locale()),
                lean(c, drawing));
    }

    private static Picture picture(SvgWriter svg, Estimate c, Drawing drawing) {
        Locale locale = drawing.locale();
        List<String> head = List.of(
                drawing.text("plot.lean.c"),
                drawing.text("plot.from"),
                drawing.text("plot.to"),
                drawing.text("plot.lean.lean"));
        List<String> row = List.of(
                Numerals.DECIMAL.orDash(c.value(), locale),
                Numerals.DECIMAL.orDash(c.low(), locale),
                Numerals.DECIMAL.orDash(c.high(), locale),
                c.value() == null ? "–" : lean(c, drawing));
        return new Picture(svg.toString(), drawing.text("plot.lean.caption"), head, List.of(row));
    }
}
