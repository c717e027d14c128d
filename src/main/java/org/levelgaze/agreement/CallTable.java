package org.levelgaze.agreement;

/**
 * Two judgements side by side, counted. The first word is the appraiser's call (or the first appraiser's), the second the
 * true state, good being "accept" (or the second appraiser's call).
 *
 * @param rejectReject both reject
 * @param rejectAccept the first rejects, the second accepts
 * @param acceptReject the first accepts, the second rejects
 * @param acceptAccept both accept
 */
public record CallTable(long rejectReject, long rejectAccept, long acceptReject, long acceptAccept) {

    /** All calls in the table. */
    public long total() {
        return rejectReject + rejectAccept + acceptReject + acceptAccept;
    }
}
