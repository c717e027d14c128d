package org.levelgaze.agreement;

import java.util.function.DoubleUnaryOperator;
import org.apache.commons.math3.analysis.solvers.BrentSolver;
import org.jspecify.annotations.Nullable;

/** Score interval of a ratio of two independent shares (Koopman, Biometrics 40 (1984) 513-517). */
final class RatioInterval {

    private static final Memo<Interval> KNOWN = new Memo<>(1 << 13);
    private static final double ACCURACY = 1e-13;
    private static final int STEPS = 200;

    private RatioInterval() {}

    /**
     * The ratios (x1/n1) / (x2/n2) that the score test does not refuse. {@code null} where there is nothing to tell from:
     * no call on one side, or no mistake on either.
     */
    static @Nullable Interval koopman(long x1, long n1, long x2, long n2, double confidence) {
        if (n1 == 0 || n2 == 0 || x1 + x2 == 0) {
            return null;
        }
        Interval known = KNOWN.find(x1, n1, x2, n2, confidence);
        return known != null ? known : KNOWN.keep(x1, n1, x2, n2, confidence, computed(x1, n1, x2, n2, confidence));
    }

    private static Interval computed(long x1, long n1, long x2, long n2, double confidence) {
        double z = Normal.twoSided(confidence);
        double lower = x1 == 0 ? 0 : Math.exp(root(u -> score(Math.exp(u), x1, n1, x2, n2) - z));
        double upper = x2 == 0 ? Double.POSITIVE_INFINITY : Math.exp(root(u -> score(Math.exp(u), x1, n1, x2, n2) + z));
        return new Interval(lower, upper);
    }

    /**
     * How far, in standard errors under the hypothesis, the shares stand from the given ratio; falls as the ratio grows.
     * The shares under the hypothesis are the smaller root of a quadratic, written so that nothing cancels.
     */
    private static double score(double ratio, long x1, long n1, long x2, long n2) {
        double b = ratio * (n1 + x2) + x1 + n2;
        double root = Math.sqrt(Math.max(0, b * b - 4 * ratio * (n1 + n2) * (x1 + x2)));
        double p1 = Math.min(1, 2 * ratio * (x1 + x2) / (b + root));
        double p2 = Math.min(1, p1 / ratio);
        double variance = p1 * (1 - p1) / n1 + ratio * ratio * p2 * (1 - p2) / n2;
        double distance = (double) x1 / n1 - ratio * x2 / n2;
        return variance > 0 ? distance / Math.sqrt(variance) : 0;
    }

    /** The root of a falling function of the ratio's logarithm. */
    private static double root(DoubleUnaryOperator falling) {
        double low = -1;
        while (falling.applyAsDouble(low) <= 0) {
            low *= 2;
        }
        double high = 1;
        while (falling.applyAsDouble(high) >= 0) {
            high *= 2;
        }
        return new BrentSolver(ACCURACY).solve(STEPS, falling::applyAsDouble, low, high);
    }
}
