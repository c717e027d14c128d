package org.levelgaze.journal;

import java.nio.charset.StandardCharsets;
import java.util.regex.Pattern;

/**
 * One act that changed something.
 *
 * @param kind what was done, as {@code thing.verb}: {@code study.imported}, {@code token.revoked}
 * @param subject on what, as {@code thing:id}: {@code study:12}; codes of things, never a person's name
 * @param payload what the entry's digest is taken over; the payload itself is not kept in the journal
 */
@SuppressWarnings("ArrayRecordComponent")
public record Act(String kind, String subject, byte[] payload) {

    private static final Pattern KIND = Pattern.compile("[a-z][a-z0-9-]*(\\.[a-z][a-z0-9-]*)+");
    private static final Pattern SUBJECT = Pattern.compile("[a-z][a-z0-9-]*:\\P{Cntrl}+");

    /** Refuses a kind or a subject of another form. */
    public Act {
        if (!KIND.matcher(kind).matches()) {
            throw new IllegalArgumentException("A kind of act is written as thing.verb, not as " + kind);
        }
        if (!SUBJECT.matcher(subject).matches()) {
            throw new IllegalArgumentException("The subject of an act is written as thing:id, not as " + subject);
        }
        payload = payload.clone();
    }

    /** An act whose payload is a text. */
    public static Act of(String kind, String subject, String payload) {
        return new Act(kind, subject, payload.getBytes(StandardCharsets.UTF_8));
    }

    /** What the entry's digest is taken over: a copy. */
    @Override
    public byte[] payload() {
        return payload.clone();
    }
}
