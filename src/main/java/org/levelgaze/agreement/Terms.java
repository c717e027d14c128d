package org.levelgaze.agreement;

import org.jspecify.annotations.Nullable;

/**
 * What the asker wants to know, beside the calls themselves.
 *
 * @param confidence level of every interval, above 0 and below 1
 * @param defectRate true share of defective pieces in the flow of the task, above 0 and below 1; {@code null} when not set
 */
public record Terms(double confidence, @Nullable Double defectRate) {

    /** 95 %, no defect rate of the task's own. */
    public static final Terms STANDARD = new Terms(0.95, null);

    /** Refuses a level or a rate outside (0, 1). */
    public Terms {
        if (!inside(confidence)) {
            throw new IllegalArgumentException("A confidence level lies between 0 and 1, not at " + confidence);
        }
        if (defectRate != null && !inside(defectRate)) {
            throw new IllegalArgumentException("A defect rate lies between 0 and 1, not at " + defectRate);
        }
    }

    /** Written so that NaN is outside. */
    private static boolean inside(double value) {
        return value > 0 && value < 1;
    }
}
