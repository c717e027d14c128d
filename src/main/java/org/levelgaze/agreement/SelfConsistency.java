package org.levelgaze.agreement;

/**
 * Whether an appraiser agrees with himself, right or wrong.
 *
 * @param samePiece pieces with all calls equal, out of the pieces that he judged in each of his trials
 * @param samePieceAnyCalls pieces with all made calls equal, out of the pieces that he judged twice or more
 * @param fleiss his trials as raters, over the pieces that he judged in each of them
 * @param krippendorffAlpha his trials as coders, missing calls allowed
 * @param gwetAC1 his trials as raters, missing calls allowed
 */
public record SelfConsistency(
        Share samePiece,
        Share samePieceAnyCalls,
        FleissKappa fleiss,
        KrippendorffAlpha krippendorffAlpha,
        GwetAC1 gwetAC1) {}
