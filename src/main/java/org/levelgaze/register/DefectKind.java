package org.levelgaze.register;

import org.jspecify.annotations.Nullable;

/**
 * One way of being defective.
 *
 * @param code the task's own code for it
 * @param name its name on screen
 * @param severity how much it matters; null: not rated yet, as when an import brought it
 */
public record DefectKind(String code, String name, @Nullable Severity severity) {

    /** Refuses codes and names that cannot be written on a sheet. */
    public DefectKind {
        Codes.check("defect kind", code);
        Codes.checkName(name);
    }
}
