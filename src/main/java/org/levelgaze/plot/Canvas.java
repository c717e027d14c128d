package org.levelgaze.plot;

/** The frame of one picture: its size, title and text alternative. */
final class Canvas {

    private static final String FONT = "Source Sans 3, sans-serif";

    private Canvas() {}

    /**
     * Opens the picture.
     *
     * @param kind its class in the page's style sheet
     * @param hasPoints whether it has points that can be reached by keyboard when interactive
     */
    static SvgWriter open(
            Drawing drawing, String kind, double width, double height, boolean hasPoints, String title, String desc) {
        SvgWriter svg = new SvgWriter();
        boolean reachable = drawing.interactive() && hasPoints;
        String labels = drawing.id() + "-title " + drawing.id() + "-desc";
        Object[] base = {
            "xmlns",
            "http://www.w3.org/2000/svg",
            "class",
            "plot " + kind,
            "viewBox",
            "0 0 " + SvgWriter.number(width) + " " + SvgWriter.number(height),
            "width",
            width,
            "height",
            height,
            "font-family",
            FONT,
            "role",
            reachable ? "group" : "img",
            "aria-labelledby",
            labels
        };
        svg.open("svg", drawing.interactive() ? base : with(base, "alt", title + ". " + desc));
        svg.words("title", title, "id", drawing.id() + "-title");
        svg.words("desc", desc, "id", drawing.id() + "-desc");
        return svg;
    }

    /** Opens a point that says its numbers, and can be reached by keyboard where that helps. */
    static void openPoint(SvgWriter svg, boolean reachable, String label) {
        if (reachable) {
            svg.open("g", "class", "plot-point", "tabindex", 0, "role", "img", "aria-label", label);
        } else {
            svg.open("g", "class", "plot-point");
        }
        svg.words("title", label);
    }

    /** A text cut to what fits into a width, on the safe side for a proportional face. */
    static String cut(String text, double width, double size) {
        int most = Math.max(1, (int) (width / (0.56 * size)));
        int length = text.codePointCount(0, text.length());
        return length <= most ? text : text.substring(0, text.offsetByCodePoints(0, most - 1)) + "…";
    }

    private static Object[] with(Object[] base, Object... more) {
        Object[] all = new Object[base.length + more.length];
        System.arraycopy(base, 0, all, 0, base.length);
        System.arraycopy(more, 0, all, base.length, more.length);
        return all;
    }
}
