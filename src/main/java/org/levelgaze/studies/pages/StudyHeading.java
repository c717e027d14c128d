package org.levelgaze.studies.pages;

import java.util.List;
import org.jspecify.annotations.Nullable;
import org.levelgaze.register.Appraiser;
import org.levelgaze.register.CameraConfiguration;
import org.levelgaze.register.Task;
import org.levelgaze.sets.Edition;
import org.levelgaze.sets.ReferenceSet;
import org.levelgaze.studies.StudyHead;

/**
 * What a study was: read for the top of every page that shows it.
 *
 * @param study the study
 * @param task what was judged
 * @param set on which pieces
 * @param edition the edition used
 * @param taking who judged, in the order of the study
 */
record StudyHeading(StudyHead study, Task task, ReferenceSet set, Edition edition, List<Taking> taking) {

    /**
     * One appraiser of the study.
     *
     * @param appraiser who
     * @param name how pages name him; with the code where two share a name
     * @param configuration the camera configuration that the study names; null: none named
     * @param trials how many trials
     */
    public record Taking(
            Appraiser appraiser, String name, @Nullable CameraConfiguration configuration, int trials) {}

    /** Keeps its own copy. */
    public StudyHeading {
        taking = List.copyOf(taking);
    }

    /** The names of all who judged, in one line. */
    public String names() {
        return String.join(", ", taking.stream().map(Taking::name).toList());
    }
}
