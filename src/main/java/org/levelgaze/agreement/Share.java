package org.levelgaze.agreement;

import org.jspecify.annotations.Nullable;

/**
 * A share of counted things, with two intervals. Both are those of plain counts: where a piece is looked at more than
 * once and calls are counted, they are too narrow.
 *
 * @param k how many
 * @param n out of how many
 * @param value k / n, {@code null} at n = 0
 * @param clopperPearson exact interval, alpha/2 on each side, also at k = 0 and k = n (Clopper &amp; Pearson, Biometrika 26
 *     (1934) 404-413); 0 to 1 at n = 0
 * @param wilson score interval without continuity correction (Wilson, J. Am. Stat. Assoc. 22 (1927) 209-212; method 3 of
 *     Newcombe, Stat. Med. 17 (1998) 857-872); 0 to 1 at n = 0
 */
public record Share(long k, long n, @Nullable Double value, Interval clopperPearson, Interval wilson) {

    private static final Memo<Share> KNOWN = new Memo<>(1 << 15);

    /**
     * The share of {@code k} out of {@code n}.
     *
     * @param k 0 to n
     * @param n 0 or more
     * @param confidence level of the intervals, above 0 and below 1
     * @throws IllegalArgumentException when k is below 0 or above n, or the level is not between 0 and 1
     */
    public static Share of(long k, long n, double confidence) {
        if (k < 0 || k > n) {
            throw new IllegalArgumentException("A share of " + k + " out of " + n + " cannot be");
        }
        Share known = KNOWN.find(k, n, 0, 0, confidence);
        return known != null ? known : KNOWN.keep(k, n, 0, 0, confidence, computed(k, n, confidence));
    }

    private static Share computed(long k, long n, double confidence) {
        if (!(confidence > 0 && confidence < 1)) {
            throw new IllegalArgumentException("A confidence level lies between 0 and 1, not at " + confidence);
        }
        Double value = n == 0 ? null : (double) k / n;
        return new Share(
                k, n, value, ShareIntervals.clopperPearson(k, n, confidence), ShareIntervals.wilson(k, n, confidence));
    }
}
