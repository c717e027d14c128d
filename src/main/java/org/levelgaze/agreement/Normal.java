package org.levelgaze.agreement;

import org.apache.commons.math3.special.Erf;

/** The standard normal distribution. */
final class Normal {

    private static final double ROOT_OF_2 = Math.sqrt(2);
    private static final double DENSITY_AT_0 = 1 / Math.sqrt(2 * Math.PI);

    private Normal() {}

    /** The value below which the share {@code p} of the distribution lies, 0 &lt; p &lt; 1. */
    static double quantile(double p) {
        return ROOT_OF_2 * Erf.erfInv(2 * p - 1);
    }

    /** The half width, in standard errors, of a two-sided interval at this level. */
    static double twoSided(double confidence) {
        return ROOT_OF_2 * Erf.erfInv(confidence);
    }

    /** The density at {@code x}. */
    static double density(double x) {
        return DENSITY_AT_0 * Math.exp(-x * x / 2);
    }
}
