package org.levelgaze.studies.importing;

import java.util.List;
import org.jspecify.annotations.Nullable;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.RowError;
import org.levelgaze.studies.ImportOutcome;

/**
 * Why a run stored nothing: a refusal, or questions. Kept as JSON with the upload.
 *
 * @param said the refusal; null when there are questions
 * @param questions what must be said yes to first; null when it was refused
 */
record ImportProblem(@Nullable Said said, ImportOutcome.@Nullable Asked questions) {

    /** A refusal in parts. */
    record Said(Refusal.Kind kind, String type, List<Object> arguments, List<RowError> rows, long rowsInAll) {}

    static ImportProblem of(Refusal refusal) {
        return new ImportProblem(
                new Said(refusal.kind(), refusal.type(), refusal.arguments(), refusal.rows(), refusal.rowsInAll()),
                null);
    }

    static ImportProblem of(ImportOutcome.Asked asked) {
        return new ImportProblem(null, asked);
    }

    @Nullable
    Refusal refusal() {
        return said == null
                ? null
                : new Refusal(said.kind(), said.type(), said.arguments(), said.rows(), said.rowsInAll());
    }
}
