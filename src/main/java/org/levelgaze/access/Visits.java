package org.levelgaze.access;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import jakarta.servlet.http.HttpSession;
import org.springframework.security.web.authentication.session.SessionAuthenticationStrategy;
import org.springframework.security.web.savedrequest.DefaultSavedRequest;
import org.springframework.security.web.savedrequest.RequestCache;
import org.springframework.stereotype.Component;
import org.springframework.web.servlet.LocaleResolver;

/** Opens and ends the session of a person in a browser. */
@Component
class Visits {

    private final SessionAccounts sessions;
    private final SessionAuthenticationStrategy freshSecrets;
    private final RequestCache wanted;
    private final LocaleResolver languages;

    Visits(
            SessionAccounts sessions,
            SessionAuthenticationStrategy freshSecrets,
            RequestCache wanted,
            LocaleResolver languages) {
        this.sessions = sessions;
        this.freshSecrets = freshSecrets;
        this.wanted = wanted;
        this.languages = languages;
    }

    /** Signs the account in, in its language, under a session id that nobody knew before. */
    void open(Account account, HttpServletRequest request, HttpServletResponse response) {
        freshSecrets.onAuthentication(
                Caller.person(account.actor(), account.displayName(), account.roles()), request, response);
        sessions.signIn(account, request.getSession());
        languages.setLocale(request, response, account.language());
    }

    /** The page that was asked for before the sign-in, Today when there was none. */
    String wantedPage(HttpServletRequest request, HttpServletResponse response) {
        if (wanted.getRequest(request, response) instanceof DefaultSavedRequest saved) {
            wanted.removeRequest(request, response);
            String query = saved.getQueryString();
            return saved.getServletPath() + (query == null ? "" : "?" + query);
        }
        return "/";
    }

    /** Signs out. */
    void end(HttpServletRequest request) {
        HttpSession session = request.getSession(false);
        if (session != null) {
            session.invalidate();
        }
    }
}
