package org.levelgaze.studies;

import java.time.LocalDate;
import org.jspecify.annotations.Nullable;

/**
 * What one study showed of one appraiser, in the few figures that lists and trends read.
 *
 * @param studyId the study
 * @param performedOn its day at the site
 * @param taskId what was judged
 * @param setId the set on which
 * @param effectiveness pieces right in all trials, of complete pieces
 * @param falseAccept accepts, of calls on defective pieces
 * @param falseReject rejects, of calls on good pieces
 * @param biasRatio false reject / false accept, of rates; null: see the status
 * @param biasStatus finite, infinite or undefined (0/0)
 * @param criterionC above 0 leans lenient; null when undefined
 * @param criterionCLow lower end of its interval; null when undefined
 * @param criterionCHigh upper end of its interval; null when undefined
 */
public record Figure(
        long studyId,
        LocalDate performedOn,
        long taskId,
        long setId,
        Count effectiveness,
        Count falseAccept,
        Count falseReject,
        @Nullable Double biasRatio,
        String biasStatus,
        @Nullable Double criterionC,
        @Nullable Double criterionCLow,
        @Nullable Double criterionCHigh) {

    /**
     * So many of so many.
     *
     * @param k how many
     * @param n of how many
     */
    public record Count(int k, int n) {}
}
