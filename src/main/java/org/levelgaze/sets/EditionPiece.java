package org.levelgaze.sets;

import org.jspecify.annotations.Nullable;

/**
 * A piece as an edition holds it.
 *
 * @param id its number
 * @param label what is written on it
 * @param trueState what was decided
 * @param defectKind the kind of defect, by the task's code; null when good or not said
 * @param zone how easy it is to call; null when not said
 */
public record EditionPiece(
        long id,
        String label,
        TrueState trueState,
        @Nullable String defectKind,
        @Nullable Zone zone) {}
