package org.levelgaze.agreement;

/**
 * A two-sided interval.
 *
 * @param lower its lower end
 * @param upper its upper end, {@link Double#POSITIVE_INFINITY} when it is open upwards (written as {@code null} in JSON)
 */
public record Interval(double lower, double upper) {

    /** Refuses ends that are not numbers or stand the wrong way round. */
    public Interval {
        if (!(lower <= upper)) {
            throw new IllegalArgumentException("An interval cannot run from " + lower + " to " + upper);
        }
    }

    /** Whether the value lies inside, the ends included. */
    public boolean contains(double value) {
        return lower <= value && value <= upper;
    }

    /** An estimate with the same distance to both sides. */
    static Interval around(double estimate, double distance) {
        return new Interval(estimate - distance, estimate + distance);
    }
}
