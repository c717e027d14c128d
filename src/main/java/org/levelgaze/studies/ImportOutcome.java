package org.levelgaze.studies;

import java.util.List;
import org.jspecify.annotations.Nullable;

/** What became of a file of calls that could be read. */
public sealed interface ImportOutcome {

    /**
     * It is stored.
     *
     * @param study what was stored, without its calls
     */
    record Stored(StudyHead study) implements ImportOutcome {}

    /**
     * Nothing was stored, since the user must say yes first.
     *
     * @param unknownSet the set's code is not known
     * @param unknownAppraisers words of the file that are neither code nor name of an appraiser
     * @param unknownKinds defect kinds of the file that the task does not have
     * @param duplicateOf the study that the same bytes already made for this task, set and day; null: none
     */
    record Asked(
            boolean unknownSet,
            List<String> unknownAppraisers,
            List<String> unknownKinds,
            @Nullable Long duplicateOf) implements ImportOutcome {

        /** Keeps its own copies of the lists. */
        public Asked {
            unknownAppraisers = List.copyOf(unknownAppraisers);
            unknownKinds = List.copyOf(unknownKinds);
        }

        /** Whether there is anything to say yes to. */
        boolean anything() {
            return unknownSet || !unknownAppraisers.isEmpty() || !unknownKinds.isEmpty() || duplicateOf != null;
        }
    }
}
