package org.levelgaze.agreement;

import org.jspecify.annotations.Nullable;

/**
 * One piece of a study.
 *
 * @param label its name, exactly as written
 * @param truth its true state
 * @param defectKind the true kind of its defect; {@code null} when it is good or the kind is not known
 */
public record Piece(String label, TrueState truth, @Nullable String defectKind) {}
