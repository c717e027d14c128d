package org.levelgaze.agreement;

/**
 * Fisher's exact test of false accepts out of calls on defective pieces against false rejects out of calls on good pieces:
 * is it by chance that one is more frequent? Two-sided: all tables at most as likely as the one found (Fisher 1934; the
 * general-purpose statistics libraries agree on this rule).
 *
 * @param pTwoSided probability of such tables, 1 when there is nothing to compare
 */
public record LeanTest(double pTwoSided) {

    /** Two tables that differ by rounding alone are equally likely. */
    private static final double ROUNDING = 1 + 1e-7;

    static LeanTest of(long falseAccepts, long defectiveCalls, long falseRejects, long goodCalls) {
        Hypergeometric tables = new Hypergeometric(defectiveCalls, goodCalls, falseAccepts + falseRejects);
        return new LeanTest(tables.atMostAsLikelyAs(falseAccepts));
    }

    /**
     * Tables with fixed margins, known by the first count. Weights are relative to the likeliest table and follow from
     * their neighbours; walks end where the weights vanish.
     */
    private record Hypergeometric(long first, long second, long mistakes) {

        double atMostAsLikelyAs(long found) {
            long likeliest = (long) ((first + 1) * ((mistakes + 1) / (double) (first + second + 2)));
            double limit = weight(likeliest, found) * ROUNDING;
            double all = 1;
            double rare = limit >= 1 ? 1 : 0;
            double weight = 1;
            for (long x = likeliest; x < highest() && weight > 0; x++) {
                weight *= up(x);
                all += weight;
                rare += weight <= limit ? weight : 0;
            }
            weight = 1;
            for (long x = likeliest; x > lowest() && weight > 0; x--) {
                weight /= up(x - 1);
                all += weight;
                rare += weight <= limit ? weight : 0;
            }
            return Math.min(1, rare / all);
        }

        private double weight(long likeliest, long found) {
            double weight = 1;
            for (long x = likeliest; x < found; x++) {
                weight *= up(x);
            }
            for (long x = likeliest; x > found; x--) {
                weight /= up(x - 1);
            }
            return weight;
        }

        /** How much likelier the count x + 1 is than x. */
        private double up(long x) {
            return (double) (first - x) * (mistakes - x) / ((double) (x + 1) * (second - mistakes + x + 1));
        }

        private long lowest() {
            return Math.max(0, mistakes - second);
        }

        private long highest() {
            return Math.min(first, mistakes);
        }
    }
}
