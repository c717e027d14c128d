package org.levelgaze.agreement;

/** Gathers units for {@link GwetAC1}, with any number of categories. */
final class GwetSums {

    private final double[] shares;
    private long judged;
    private long units;
    private double agreements;

    GwetSums(int categories) {
        shares = new double[categories];
    }

    /** Adds a unit: how many raters gave it each category. */
    void add(int[] counts) {
        add(counts, 1);
    }

    /** Adds this many units of one kind. */
    void add(int[] counts, long times) {
        int all = 0;
        for (int one : counts) {
            all += one;
        }
        if (all == 0) {
            return;
        }
        judged += times;
        long agreeing = 0;
        for (int category = 0; category < shares.length; category++) {
            int one = counts[category];
            shares[category] += one == all ? times : times * ((double) one / all);
            agreeing += (long) one * (one - 1);
        }
        if (all >= 2) {
            long pairs = (long) all * (all - 1);
            units += times;
            agreements += agreeing == pairs ? times : times * ((double) agreeing / pairs);
        }
    }

    GwetAC1 result() {
        if (units == 0) {
            return new GwetAC1(units, null, null, null, "no piece has two calls");
        }
        double observed = agreements / units;
        double expected = 0;
        for (double share : shares) {
            double mean = share / judged;
            expected += mean * (1 - mean);
        }
        expected /= shares.length - 1;
        return new GwetAC1(units, (observed - expected) / (1 - expected), observed, expected, null);
    }
}
