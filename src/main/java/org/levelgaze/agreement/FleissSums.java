package org.levelgaze.agreement;

/** Gathers pieces for {@link FleissKappa}, with any number of categories. */
final class FleissSums {

    private final int raters;
    private final long[] ratings;
    private long pieces;
    private long squares;

    FleissSums(int categories, int raters) {
        this.ratings = new long[categories];
        this.raters = raters;
    }

    /** Adds a piece: how many of the raters chose each category. */
    void add(int[] counts) {
        pieces++;
        for (int category = 0; category < ratings.length; category++) {
            ratings[category] += counts[category];
            squares += (long) counts[category] * counts[category];
        }
    }

    /** Mean share of pairs of ratings of a piece that agree. */
    double observed() {
        double all = (double) pieces * raters;
        return (squares - all) / (all * (raters - 1));
    }

    /** The same by chance, from the shares of the categories. */
    double expected() {
        double sum = 0;
        for (long one : ratings) {
            sum += share(one) * share(one);
        }
        return sum;
    }

    FleissKappa result() {
        if (pieces == 0) {
            return new FleissKappa(pieces, raters, null, null, "no piece is complete");
        }
        if (raters < 2) {
            return new FleissKappa(pieces, raters, null, null, "there is one call per piece");
        }
        if (oneCategoryOnly()) {
            return new FleissKappa(pieces, raters, null, null, "chance agreement is 1: every call is the same");
        }
        double expected = expected();
        return new FleissKappa(
                pieces, raters, (observed() - expected) / (1 - expected), standardErrorUnderNull(), null);
    }

    /** Fleiss, Nee &amp; Landis 1979. */
    private double standardErrorUnderNull() {
        double spread = 0;
        double skew = 0;
        for (long one : ratings) {
            double p = share(one);
            spread += p * (1 - p);
            skew += p * (1 - p) * (1 - 2 * p);
        }
        double all = (double) pieces * raters;
        return Math.sqrt(2 * (spread * spread - skew) / (all * (raters - 1))) / spread;
    }

    private boolean oneCategoryOnly() {
        for (long one : ratings) {
            if (one == pieces * raters) {
                return true;
            }
        }
        return false;
    }

    private double share(long one) {
        return (double) one / ((double) pieces * raters);
    }
}
