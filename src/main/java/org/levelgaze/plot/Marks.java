package org.levelgaze.plot;

/** The marks of all pictures, told apart by shape as well as by colour. */
final class Marks {

    private Marks() {}

    static void dot(SvgWriter svg, double x, double y, double radius, Tone tone) {
        svg.leaf("circle", "cx", x, "cy", y, "r", radius, "class", tone.fill(), "fill", tone.paper());
    }

    /** Points to the lenient end. */
    static void lenient(SvgWriter svg, double x, double y, double radius) {
        shape(svg, Tone.LENIENT, "M", x - radius, y - radius, "L", x + radius, y, "L", x - radius, y + radius);
    }

    /** Points to the strict end. */
    static void strict(SvgWriter svg, double x, double y, double radius) {
        shape(svg, Tone.STRICT, "M", x + radius, y - radius, "L", x - radius, y, "L", x + radius, y + radius);
    }

    /** Outside of what is asked. */
    static void diamond(SvgWriter svg, double x, double y, double radius, Tone tone) {
        shape(svg, tone, "M", x, y - radius, "L", x + radius, y, "L", x, y + radius, "L", x - radius, y);
    }

    private static void shape(SvgWriter svg, Tone tone, Object... steps) {
        svg.leaf("path", "d", path(steps) + "Z", "class", tone.fill(), "fill", tone.paper());
    }

    /** Path data of commands and numbers. */
    static String path(Object... steps) {
        StringBuilder path = new StringBuilder();
        for (Object step : steps) {
            path.append(step instanceof Number number ? SvgWriter.number(number.doubleValue()) : step)
                    .append(' ');
        }
        return path.toString();
    }
}
