package org.levelgaze.journal;

import org.levelgaze.shared.SiteId;

/**
 * Who acts, and at which site: the first parameter of every call that changes something.
 *
 * @param site where
 * @param who {@code account:7}, {@code token:3} or {@code system}; never a person's name
 */
public record Actor(SiteId site, String who) {

    /** Refuses an empty name. */
    public Actor {
        if (who.isBlank()) {
            throw new IllegalArgumentException("An actor is account:ID, token:ID or system, not nothing");
        }
    }

    /** The program itself at this site. */
    public static Actor system(SiteId site) {
        return new Actor(site, "system");
    }
}
