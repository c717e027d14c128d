package org.levelgaze.agreement;

/**
 * McNemar's test on counts, exact (McNemar, Psychometrika 12 (1947) 153-157; Fay, R Journal 2 (2010) 53-58). It says
 * nothing about lean when a set is unbalanced.
 *
 * @param falseAccept calls that let a defective piece through
 * @param falseReject calls that held a good piece back
 * @param pTwoSided min(1, 2 P(X &lt;= the smaller)), X binomial with 1/2; 1 when there is neither
 */
public record McNemar(long falseAccept, long falseReject, double pTwoSided) {

    static McNemar of(long falseAccept, long falseReject) {
        return new McNemar(
                falseAccept, falseReject, twoSided(falseAccept + falseReject, Math.min(falseAccept, falseReject)));
    }

    /**
     * Weights of the binomial distribution relative to its middle, from there downwards until they vanish; the upper half
     * mirrors the lower one.
     */
    private static double twoSided(long n, long smaller) {
        long middle = n / 2;
        double weight = 1;
        double half = n % 2 == 0 ? weight / 2 : weight;
        double tail = middle <= smaller ? weight : 0;
        for (long k = middle; k > 0 && weight > 0; k--) {
            weight *= (double) k / (n - k + 1);
            half += weight;
            tail += k - 1 <= smaller ? weight : 0;
        }
        return Math.min(1, tail / half);
    }
}
