package org.levelgaze.demo;

import org.jspecify.annotations.Nullable;
import org.levelgaze.sets.NewPiece;
import org.levelgaze.sets.TrueState;
import org.levelgaze.sets.Zone;

/**
 * An invented piece.
 *
 * @param label what is written on it
 * @param defect its defect kind; null: it is good
 * @param hard whether it sits at the limit of acceptance
 */
record DemoPiece(String label, @Nullable String defect, boolean hard) {

    boolean defective() {
        return defect != null;
    }

    NewPiece toPiece() {
        Zone clear = defective() ? Zone.CLEAR_DEFECTIVE : Zone.CLEAR_GOOD;
        return new NewPiece(
                label, defective() ? TrueState.DEFECTIVE : TrueState.GOOD, defect, hard ? Zone.BORDERLINE : clear);
    }
}
