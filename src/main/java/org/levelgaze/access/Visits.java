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

    /**
     * Signs the account in, in its language and in a session that has nothing of the one before: neither its id, which
     * somebody may have planted, nor what somebody else left in it.
     *
     * @return the page that was asked for before the sign-in, Today when there was none
     */
    String enter(Account account, HttpServletRequest request, HttpServletResponse response) {
        String wantedPage = wantedPage(request, response);
        end(request);
        sessions.signIn(account, request.getSession());
        languages.setLocale(request, response, account.language());
        return wantedPage;
    }

    /** Goes on after a change of the account, under a new session id and with new secrets in its forms. */
    void goOn(Account account, HttpServletRequest request, HttpServletResponse response) {
        freshSecrets.onAuthentication(
                Caller.person(account.actor(), account.displayName(), account.roles()), request, response);
        sessions.signIn(account, request.getSession());
        languages.setLocale(request, response, account.language());
    }

    private String wantedPage(HttpServletRequest request, HttpServletResponse response) {
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
