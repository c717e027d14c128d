package org.levelgaze.agreement;

/** Gathers units for {@link KrippendorffAlpha}, with any number of categories: the coincidence matrix, off its diagonal. */
final class KrippendorffSums {

    private final long[] values;
    private long units;
    private double disagreements;

    KrippendorffSums(int categories) {
        values = new long[categories];
    }

    /** Adds a unit: how many coders gave it each value. A unit with fewer than two values says nothing. */
    void add(int[] counts) {
        int all = 0;
        for (int one : counts) {
            all += one;
        }
        if (all < 2) {
            return;
        }
        units++;
        long mixed = 0;
        for (int category = 0; category < values.length; category++) {
            values[category] += counts[category];
            mixed += (long) counts[category] * (all - counts[category]);
        }
        if (mixed > 0) {
            disagreements += (double) mixed / (all - 1);
        }
    }

    KrippendorffAlpha result() {
        long all = 0;
        for (long one : values) {
            all += one;
        }
        double expected = 0;
        for (long one : values) {
            expected += (double) one * (all - one);
        }
        if (units == 0) {
            return new KrippendorffAlpha(units, all, null, "no piece has two calls");
        }
        if (expected == 0) {
            return new KrippendorffAlpha(units, all, null, "expected disagreement is 0: every call is the same");
        }
        return new KrippendorffAlpha(units, all, 1 - (all - 1) * disagreements / expected, null);
    }
}
