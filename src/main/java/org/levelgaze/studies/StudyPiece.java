package org.levelgaze.studies;

import org.jspecify.annotations.Nullable;
import org.levelgaze.sets.TrueState;

/**
 * A piece as a study names it, with what the edition says of it.
 *
 * @param number its place in the file, from 0
 * @param pieceId the piece
 * @param label what is written on it
 * @param trueState what was decided
 * @param defectKind the kind of defect; null when good or not said
 */
public record StudyPiece(
        int number,
        long pieceId,
        String label,
        TrueState trueState,
        @Nullable String defectKind) {

    /** The engine's word for the true state; null when the piece is not scored. */
    org.levelgaze.agreement.@Nullable TrueState scoredAs() {
        return switch (trueState) {
            case GOOD -> org.levelgaze.agreement.TrueState.GOOD;
            case DEFECTIVE -> org.levelgaze.agreement.TrueState.DEFECTIVE;
            case GREY -> null;
        };
    }
}
