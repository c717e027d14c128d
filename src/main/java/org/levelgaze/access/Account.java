package org.levelgaze.access;

import java.util.Locale;
import java.util.Set;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.SiteId;

/**
 * A person's account, without what proves that it is this person.
 *
 * @param site where it belongs
 * @param id its number
 * @param loginName what the person types to sign in
 * @param displayName the person's name on screen
 * @param roles what the account is for
 * @param language the language of its pages
 * @param active whether it may sign in
 * @param credentials counts its passwords; a session opened with an earlier one is over
 */
public record Account(
        SiteId site,
        long id,
        String loginName,
        String displayName,
        Set<Role> roles,
        Locale language,
        boolean active,
        int credentials) {

    /** Keeps its own copy of the roles. */
    public Account {
        roles = Set.copyOf(roles);
    }

    /** This account as one who acts. */
    public Actor actor() {
        return new Actor(site, subject());
    }

    /** This account as the journal names it. */
    String subject() {
        return "account:" + id;
    }
}
