package org.levelgaze.agreement;

import org.jspecify.annotations.Nullable;

/**
 * Which way the mistakes go: false reject / false accept (common practice). Above 1 the appraiser is too tight and mistakes
 * stay in house, below 1 too loose.
 *
 * @param ofRates ratio of the two shares, the one that rules use; {@code null} when there is no false accept
 * @param ofCounts ratio of the two counts; {@code null} when there is no false accept
 * @param status whether {@code ofRates} is a number
 * @param interval score interval of the ratio of the two shares (Koopman, Biometrics 40 (1984) 513-517): 0 at its lower end
 *     without a false reject, open upwards without a false accept, {@code null} at 0/0. Where it contains 1, the two are not
 *     distinguishable from even
 */
public record BiasRatio(
        @Nullable Double ofRates,
        @Nullable Double ofCounts,
        Status status,
        @Nullable Interval interval) {

    /** Whether the ratio is a number. */
    public enum Status {
        /** It is. */
        FINITE("finite"),
        /** There are false rejects and no false accept. */
        INFINITE("infinite"),
        /** There is neither, or no call to tell from. */
        UNDEFINED("undefined (0/0)");

        private final String text;

        Status(String text) {
            this.text = text;
        }

        /** The word in the JSON form. */
        public String text() {
            return text;
        }
    }

    /**
     * The ratio of two shares.
     *
     * @param falseReject rejects of good pieces
     * @param falseAccept accepts of defective pieces
     * @param confidence level of the interval, above 0 and below 1
     */
    public static BiasRatio of(Share falseReject, Share falseAccept, double confidence) {
        Double rejects = falseReject.value();
        Double accepts = falseAccept.value();
        Double ofCounts = falseAccept.k() == 0 ? null : (double) falseReject.k() / falseAccept.k();
        Interval interval =
                RatioInterval.koopman(falseReject.k(), falseReject.n(), falseAccept.k(), falseAccept.n(), confidence);
        if (rejects == null || accepts == null || (rejects == 0 && accepts == 0)) {
            return new BiasRatio(null, ofCounts, Status.UNDEFINED, interval);
        }
        if (accepts == 0) {
            return new BiasRatio(null, null, Status.INFINITE, interval);
        }
        return new BiasRatio(rejects / accepts, ofCounts, Status.FINITE, interval);
    }
}
