package org.levelgaze.studies.reading;

import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.TrueState;

/**
 * A piece as a file names it.
 *
 * @param label its label, exactly as written
 * @param truth its true state; {@code null} when the file does not say
 * @param defectKind the true kind of its defect; {@code null} when the file does not say
 * @param row the first row that names it, the header being 1
 */
public record RecordedPiece(
        String label, @Nullable TrueState truth, @Nullable String defectKind, int row) {}
