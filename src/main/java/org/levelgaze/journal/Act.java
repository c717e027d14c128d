package org.levelgaze.journal;

import java.nio.charset.StandardCharsets;

/**
 * One act that changed something.
 *
 * @param kind what was done, as {@code thing.verb}: {@code study.imported}, {@code token.revoked}
 * @param subject on what, as {@code thing:id}: {@code study:12}; codes of things, never a person's name
 * @param payload what the entry's digest is taken over; the payload itself is not kept in the journal
 */
@SuppressWarnings("ArrayRecordComponent")
public record Act(String kind, String subject, byte[] payload) {

    /** An act whose payload is a text. */
    public static Act of(String kind, String subject, String payload) {
        return new Act(kind, subject, payload.getBytes(StandardCharsets.UTF_8));
    }
}
