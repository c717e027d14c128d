package org.levelgaze.studies.sentences;

import java.util.OptionalInt;
import org.levelgaze.agreement.Share;

/** How many pieces it would take, at the same share, until an exact interval no longer holds a limit. */
final class PiecesToSettle {

    private static final int MOST = 2_000;
    private static final int STEP = 10;

    private PiecesToSettle() {}

    /** A multiple of ten; empty when the share is the limit itself or it would take more than 2,000. */
    static OptionalInt of(Share share, double limit, double confidence) {
        Double value = share.value();
        if (value == null || value == limit) {
            return OptionalInt.empty();
        }
        for (int n = (int) (share.n() / STEP + 1) * STEP; n <= MOST; n += Math.max(STEP, n / 100 * STEP)) {
            if (!Share.of(Math.round(value * n), n, confidence).clopperPearson().contains(limit)) {
                return OptionalInt.of(n);
            }
        }
        return OptionalInt.empty();
    }
}
