package org.levelgaze.studies.sentences;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * What a study says of one appraiser, in sentences.
 *
 * @param isHeld whether every usual limit was held, a remark or none
 * @param effective is this appraiser effective?
 * @param lean which way do the mistakes go?
 * @param ratio how the bias ratio reads; empty without a mistake
 * @param sure how sure can one be with this many pieces?
 * @param next what to do next, the most pressing first
 * @param kappa why kappa is low beside a high agreement; {@code null} when it is not
 */
public record InWords(
        boolean isHeld,
        String effective,
        String lean,
        String ratio,
        String sure,
        List<String> next,
        @Nullable String kappa) {

    /** Keeps its own copy of the list. */
    public InWords {
        next = List.copyOf(next);
    }
}
