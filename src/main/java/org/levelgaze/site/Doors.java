package org.levelgaze.site;

import java.security.Principal;
import org.jspecify.annotations.Nullable;
import org.springframework.beans.factory.ObjectProvider;
import org.springframework.security.core.Authentication;
import org.springframework.security.web.access.WebInvocationPrivilegeEvaluator;
import org.springframework.stereotype.Component;

/** Knows which pages somebody may open: the rules of sign-in are asked, not repeated. */
@Component
class Doors {

    /** Looked up late: the rules are made after the pages they guard. */
    private final ObjectProvider<WebInvocationPrivilegeEvaluator> rules;

    Doors(ObjectProvider<WebInvocationPrivilegeEvaluator> rules) {
        this.rules = rules;
    }

    /**
     * Whether somebody may open a page.
     *
     * @param who as the request names him; nobody may open anything
     * @param contextPath where the application stands
     * @param href the page, from the root of the application
     */
    boolean isOpen(@Nullable Principal who, String contextPath, String href) {
        WebInvocationPrivilegeEvaluator evaluator = rules.getIfAvailable();
        return evaluator != null
                && who instanceof Authentication authentication
                && evaluator.isAllowed(contextPath, href, "GET", authentication);
    }
}
