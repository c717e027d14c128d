package org.levelgaze.testing;

import java.util.Set;
import org.levelgaze.access.Caller;
import org.levelgaze.access.Role;
import org.levelgaze.access.Scope;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.SiteId;
import org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors;
import org.springframework.test.web.servlet.request.RequestPostProcessor;

/** Sends a request as somebody: {@code mvc.perform(get("/studies").with(As.person(QUALITY_ENGINEER)))}. */
public final class As {

    private As() {}

    /** A signed-in person at the main site with these roles. */
    public static RequestPostProcessor person(Role... roles) {
        return SecurityMockMvcRequestPostProcessors.authentication(
                Caller.person(new Actor(SiteId.MAIN, "account:1"), "Ana Tarn", Set.of(roles)));
    }

    /** A program with a token of these scopes at the main site. */
    public static RequestPostProcessor program(Scope... scopes) {
        return SecurityMockMvcRequestPostProcessors.authentication(
                Caller.program(new Actor(SiteId.MAIN, "token:1"), "Line 4", Set.of(scopes)));
    }
}
