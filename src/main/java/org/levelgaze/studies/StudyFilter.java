package org.levelgaze.studies;

import java.time.LocalDate;
import org.jspecify.annotations.Nullable;

/**
 * Which studies are wanted; null: any.
 *
 * @param taskId of this task
 * @param setId on this set
 * @param appraiserId with this appraiser
 * @param from performed on this day or later
 * @param to performed on this day or earlier
 */
public record StudyFilter(
        @Nullable Long taskId,
        @Nullable Long setId,
        @Nullable Long appraiserId,
        @Nullable LocalDate from,
        @Nullable LocalDate to) {

    /** Every study. */
    public static final StudyFilter ALL = new StudyFilter(null, null, null, null, null);
}
