package org.levelgaze.access;

import java.time.Instant;
import java.time.LocalDate;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.SiteId;

/**
 * What a program shows to be let in, without the secret itself.
 *
 * @param site where it holds
 * @param id its number
 * @param label what it is called
 * @param scopes what it may do
 * @param createdAt since when it holds
 * @param lastUsedOn the last day on which it was shown, null when never
 * @param revokedAt since when it holds no longer, null while it does
 */
public record Token(
        SiteId site,
        long id,
        String label,
        Set<Scope> scopes,
        Instant createdAt,
        @Nullable LocalDate lastUsedOn,
        @Nullable Instant revokedAt) {

    /** Keeps its own copy of the scopes. */
    public Token {
        scopes = Set.copyOf(scopes);
    }

    /** This token as one who acts. */
    Actor actor() {
        return new Actor(site, subject());
    }

    /** This token as the journal names it. */
    String subject() {
        return "token:" + id;
    }
}
