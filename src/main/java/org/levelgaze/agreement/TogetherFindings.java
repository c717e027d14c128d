package org.levelgaze.agreement;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * What all appraisers' calls show together. A piece is complete when everybody judged it in each of his own trials; an
 * appraiser who made no call at all takes no part.
 *
 * @param allRight complete pieces with every call of everybody right
 * @param allSame complete pieces with every call of everybody equal; {@code null} when one call per piece is all there is
 * @param fleiss appraisers x trials as raters, over complete pieces; {@code null} with one appraiser
 * @param krippendorffAlpha appraisers x trials as coders; {@code null} with one appraiser
 * @param gwetAC1 appraisers x trials as raters; {@code null} with one appraiser
 * @param pairs every two appraisers, in the order in which they appear; none with one appraiser
 */
public record TogetherFindings(
        Share allRight,
        @Nullable Share allSame,
        @Nullable FleissKappa fleiss,
        @Nullable KrippendorffAlpha krippendorffAlpha,
        @Nullable GwetAC1 gwetAC1,
        List<AppraiserPair> pairs) {

    /** Keeps its own copy of the list. */
    public TogetherFindings {
        pairs = List.copyOf(pairs);
    }
}
