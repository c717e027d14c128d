package org.levelgaze.studies;

import java.time.Instant;
import java.time.LocalDate;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.levelgaze.shared.SiteId;

/**
 * A stored study without its calls.
 *
 * @param site where
 * @param id its number
 * @param taskId what was judged
 * @param setId the set on which
 * @param edition the edition that stood when the study was recorded
 * @param performedOn the day at the site
 * @param fileName the file it came from
 * @param pieces how many pieces it names
 * @param calls how many calls it holds
 * @param callsMissing how many a complete study would hold beside them
 * @param recordedAt when it was stored
 * @param concludedAt when it was concluded; null: not yet
 * @param appraisers who judged, in the order of the file
 */
public record StudyHead(
        SiteId site,
        long id,
        long taskId,
        long setId,
        int edition,
        LocalDate performedOn,
        String fileName,
        int pieces,
        long calls,
        long callsMissing,
        Instant recordedAt,
        @Nullable Instant concludedAt,
        List<Participant> appraisers) {

    /** Keeps its own copy of the list. */
    public StudyHead {
        appraisers = List.copyOf(appraisers);
    }

    /** Whether its findings stand. */
    public boolean concluded() {
        return concludedAt != null;
    }

    /**
     * One appraiser of a study.
     *
     * @param number his place in the study, from 0
     * @param appraiserId who
     * @param configuration the number of the camera configuration that the study names; null: none named
     * @param trials his highest trial number with a call
     */
    public record Participant(
            int number, long appraiserId, @Nullable Integer configuration, int trials) {}
}
