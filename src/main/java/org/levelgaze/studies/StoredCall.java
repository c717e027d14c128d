package org.levelgaze.studies;

import org.jspecify.annotations.Nullable;
import org.levelgaze.sets.TrueState;

/**
 * One call as it is stored, beside the true state of its piece.
 *
 * @param pieceNumber the piece's place in the study, from 0
 * @param piece its label
 * @param trueState what was decided of it
 * @param defectKind its kind of defect; null when good or not said
 * @param appraiserNumber the appraiser's place in the study, from 0
 * @param appraiser the appraiser's code
 * @param trial from 1
 * @param accepted whether the piece was let through
 * @param seenKind the kind that was named; null when none was
 */
public record StoredCall(
        int pieceNumber,
        String piece,
        TrueState trueState,
        @Nullable String defectKind,
        int appraiserNumber,
        String appraiser,
        int trial,
        boolean accepted,
        @Nullable String seenKind) {}
