package org.levelgaze.agreement;

import org.apache.commons.math3.distribution.BetaDistribution;

/** The intervals of a share. */
final class ShareIntervals {

    /** The library's default of 1e-9 would miss the tolerance of the findings; this costs 7 % more. */
    private static final double ACCURACY = 1e-14;

    private ShareIntervals() {}

    /**
     * Clopper &amp; Pearson 1934: the shares at which k or more, k or fewer, have the probability alpha/2. They are
     * quantiles of beta distributions; the ends are 0 at k = 0 and 1 at k = n.
     */
    static Interval clopperPearson(long k, long n, double confidence) {
        double tail = (1 - confidence) / 2;
        double lower = k == 0 ? 0 : betaQuantile(k, n - k + 1, tail);
        double upper = k == n ? 1 : betaQuantile(k + 1, n - k, 1 - tail);
        return new Interval(lower, upper);
    }

    private static double betaQuantile(long a, long b, double p) {
        return new BetaDistribution(null, a, b, ACCURACY).inverseCumulativeProbability(p);
    }

    /** Wilson 1927, without continuity correction; multiplied out so that n = 0 needs no case of its own. */
    static Interval wilson(long k, long n, double confidence) {
        double z = Normal.twoSided(confidence);
        double z2 = z * z;
        double middle = k + z2 / 2;
        double distance = z * Math.sqrt((double) k * (n - k) / Math.max(n, 1) + z2 / 4);
        double lower = k == 0 ? 0 : (middle - distance) / (n + z2);
        double upper = k == n ? 1 : (middle + distance) / (n + z2);
        return new Interval(lower, upper);
    }
}
