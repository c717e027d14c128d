package org.levelgaze.plot;

import org.jspecify.annotations.Nullable;

/**
 * A figure with its interval, as far as there is one.
 *
 * @param value the figure, {@code null} where it is undefined (a share of nothing)
 * @param low the interval's lower end, {@code null} where there is none
 * @param high the interval's upper end, {@code null} where there is none
 */
public record Estimate(
        @Nullable Double value,
        @Nullable Double low,
        @Nullable Double high) {

    /** What rounding may put between a figure and the end of its interval. */
    private static final double ROUNDING = 1e-9;

    private static final Estimate NONE = new Estimate(null, null, null);

    /** Refuses what is not finite, half an interval, an interval without a figure, and a figure outside of it. */
    public Estimate {
        checkFinite("value", value);
        checkFinite("low", low);
        checkFinite("high", high);
        if ((low == null) != (high == null) || (value == null && low != null)) {
            throw new IllegalArgumentException("Half an estimate: " + value + " in " + low + " to " + high);
        }
        if (value != null && low != null && high != null && (low > value + ROUNDING || high < value - ROUNDING)) {
            throw new IllegalArgumentException(value + " is not in " + low + " to " + high);
        }
    }

    /** An undefined figure. */
    public static Estimate none() {
        return NONE;
    }

    /** Whether the whole interval lies above a number. */
    boolean isAbove(double number) {
        return low != null && low > number;
    }

    /** Whether the whole interval lies below a number. */
    boolean isBelow(double number) {
        return high != null && high < number;
    }

    private static void checkFinite(String name, @Nullable Double number) {
        if (number != null && !Double.isFinite(number)) {
            throw new IllegalArgumentException("The " + name + " of an estimate is finite, not " + number);
        }
    }
}
