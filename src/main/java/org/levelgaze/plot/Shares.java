package org.levelgaze.plot;

/** Shares of 1 and their intervals. */
final class Shares {

    private Shares() {}

    static void check(double share) {
        if (!(share >= 0 && share <= 1)) {
            throw new IllegalArgumentException("A share lies between 0 and 1, not at " + share);
        }
    }

    static void check(Estimate share) {
        if (share.value() != null) {
            check(share.value());
        }
    }

    /** How far a share reaches: to its value, or to the end of its interval; 0 when undefined. */
    static double reach(Estimate share, boolean withInterval) {
        if (withInterval && share.high() != null) {
            return share.high();
        }
        return share.value() == null ? 0 : share.value();
    }

    /** A share with its interval, in words. */
    static String written(Estimate share, Drawing drawing) {
        return written(share, Numerals.SHARE, drawing);
    }

    /** A figure with its interval, in words. */
    static String written(Estimate figure, Numerals numerals, Drawing drawing) {
        if (figure.value() == null) {
            return drawing.text("plot.none");
        }
        String value = numerals.of(figure.value(), drawing.locale());
        if (figure.low() == null || figure.high() == null) {
            return value;
        }
        return drawing.text(
                "plot.estimate",
                value,
                numerals.of(figure.low(), drawing.locale()),
                numerals.of(figure.high(), drawing.locale()));
    }
}
