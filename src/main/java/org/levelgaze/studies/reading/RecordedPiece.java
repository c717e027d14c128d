package org.levelgaze.studies.reading;

import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.TrueState;

/**
 * A piece as a file names it.
 *
 * @param label its label, exactly as written
 * @param truth its true state; {@code null} when it is undecided or the file does not say
 * @param truthSaid whether the file says anything of it, be it that it is undecided
 * @param defectKind the true kind of its defect; {@code null} when the file does not say
 * @param row the first row that names it, the header being 1
 */
public record RecordedPiece(
        String label,
        @Nullable TrueState truth,
        boolean truthSaid,
        @Nullable String defectKind,
        int row) {

    /** Whether the file says that nobody has decided it: a grey piece. */
    public boolean isGrey() {
        return truthSaid && truth == null;
    }
}
