package org.levelgaze.sets;

import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import org.levelgaze.shared.Refusal;

/**
 * A piece about to enter a set.
 *
 * @param label what is written on it, unique in the set
 * @param trueState what was decided
 * @param defectKind the kind of defect, by the task's code; null when good or not said
 * @param zone how easy it is to call; null when not said
 */
public record NewPiece(
        String label,
        TrueState trueState,
        @Nullable String defectKind,
        @Nullable Zone zone) {

    private static final int LONGEST_LABEL = 200;
    private static final Pattern CONTROL = Pattern.compile("\\p{Cntrl}");

    /** Refuses labels that cannot be read and good pieces with a defect. */
    public NewPiece {
        if (label.isBlank()
                || label.length() > LONGEST_LABEL
                || CONTROL.matcher(label).find()) {
            throw new Refusal(Refusal.Kind.INVALID, "piece-label-not-usable", label, LONGEST_LABEL);
        }
        if (trueState == TrueState.GOOD && defectKind != null) {
            throw new Refusal(Refusal.Kind.INVALID, "good-piece-with-defect", label, defectKind);
        }
    }
}
