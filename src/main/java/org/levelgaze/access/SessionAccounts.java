package org.levelgaze.access;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import jakarta.servlet.http.HttpSession;
import java.time.Clock;
import java.time.Duration;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.levelgaze.shared.SiteId;
import org.springframework.security.core.context.DeferredSecurityContext;
import org.springframework.security.core.context.SecurityContext;
import org.springframework.security.core.context.SecurityContextHolder;
import org.springframework.security.core.context.SecurityContextImpl;
import org.springframework.security.web.context.HttpRequestResponseHolder;
import org.springframework.security.web.context.SecurityContextRepository;
import org.springframework.stereotype.Component;

/**
 * Keeps in the session who is signed in, as numbers only. The account is read anew for each request, so that other roles, a
 * new password or an ended account count at once. A session ends after {@link #IDLE} without a request and
 * {@link #LONGEST} after the sign-in: a shift long, so that a screen on the shop floor is not left open for the next one.
 */
@Component
class SessionAccounts implements SecurityContextRepository {

    static final Duration IDLE = Duration.ofHours(4);
    static final Duration LONGEST = Duration.ofHours(12);

    private static final String SITE = "access.site";
    private static final String ACCOUNT = "access.account";
    private static final String CREDENTIALS = "access.credentials";
    private static final String SINCE = "access.since";

    private final Accounts accounts;
    private final Clock clock;

    SessionAccounts(Accounts accounts, Clock clock) {
        this.accounts = accounts;
        this.clock = clock;
    }

    /** Writes down that this account is signed in. */
    void signIn(Account account, HttpSession session) {
        session.setMaxInactiveInterval((int) IDLE.toSeconds());
        session.setAttribute(SITE, account.site().value());
        session.setAttribute(ACCOUNT, account.id());
        session.setAttribute(CREDENTIALS, account.credentials());
        session.setAttribute(SINCE, clock.millis());
    }

    /** The account that is signed in, if it still may be. */
    private Optional<Account> signedIn(HttpServletRequest request) {
        HttpSession session = request.getSession(false);
        if (session == null
                || !(session.getAttribute(SITE) instanceof Integer site)
                || !(session.getAttribute(ACCOUNT) instanceof Long id)
                || !(session.getAttribute(SINCE) instanceof Long since)
                || clock.millis() - since > LONGEST.toMillis()) {
            return Optional.empty();
        }
        Object credentials = session.getAttribute(CREDENTIALS);
        return accounts.find(new SiteId(site), id)
                .filter(account -> account.active() && credentials.equals(account.credentials()));
    }

    private SecurityContext load(HttpServletRequest request) {
        SecurityContext context = SecurityContextHolder.createEmptyContext();
        signedIn(request)
                .map(account -> Caller.person(account.actor(), account.displayName(), account.roles()))
                .ifPresent(context::setAuthentication);
        return context;
    }

    @Override
    public DeferredSecurityContext loadDeferredContext(HttpServletRequest request) {
        return new OnFirstUse(request);
    }

    @Override
    @SuppressWarnings("deprecation")
    public SecurityContext loadContext(HttpRequestResponseHolder holder) {
        return load(holder.getRequest());
    }

    /** Signing in is written down by {@link #signIn}; nothing else changes who is signed in. */
    @Override
    public void saveContext(SecurityContext context, HttpServletRequest request, HttpServletResponse response) {}

    @Override
    public boolean containsContext(HttpServletRequest request) {
        return signedIn(request).isPresent();
    }

    /** Asks the database when somebody asks, once for each request. */
    private final class OnFirstUse implements DeferredSecurityContext {

        private final HttpServletRequest request;
        private @Nullable SecurityContext context;

        OnFirstUse(HttpServletRequest request) {
            this.request = request;
        }

        @Override
        public SecurityContext get() {
            SecurityContext known = context == null ? load(request) : context;
            context = known;
            return known;
        }

        @Override
        public boolean isGenerated() {
            return get().equals(new SecurityContextImpl());
        }
    }
}
