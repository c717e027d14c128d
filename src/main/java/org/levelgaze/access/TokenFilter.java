package org.levelgaze.access;

import jakarta.servlet.FilterChain;
import jakarta.servlet.ServletException;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.util.Optional;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.Site;
import org.levelgaze.shared.Sites;
import org.springframework.http.HttpHeaders;
import org.springframework.security.core.context.SecurityContext;
import org.springframework.security.core.context.SecurityContextHolder;
import org.springframework.web.filter.OncePerRequestFilter;

/**
 * Lets in who shows a token in the header {@code Authorization: Bearer …}; nowhere else, since addresses end up in logs. The
 * header {@code X-Site} may name the token's site and no other.
 */
final class TokenFilter extends OncePerRequestFilter {

    private static final String SCHEME = "Bearer ";
    private static final String SITE = "X-Site";

    private final Tokens tokens;
    private final Sites sites;
    private final RefusedRequests refused;

    TokenFilter(Tokens tokens, Sites sites, RefusedRequests refused) {
        this.tokens = tokens;
        this.sites = sites;
        this.refused = refused;
    }

    @Override
    protected void doFilterInternal(HttpServletRequest request, HttpServletResponse response, FilterChain chain)
            throws ServletException, IOException {
        String shown = request.getHeader(HttpHeaders.AUTHORIZATION);
        if (shown == null) {
            chain.doFilter(request, response);
            return;
        }
        Optional<Token> token = token(shown);
        if (token.isEmpty()) {
            refused.answerUnknown(request, response);
            return;
        }
        Optional<Refusal> otherSite = otherSite(request.getHeader(SITE), token.get());
        if (otherSite.isPresent()) {
            refused.answer(request, response, otherSite.get());
            return;
        }
        letIn(token.get());
        chain.doFilter(request, response);
    }

    private Optional<Token> token(String shown) {
        return shown.regionMatches(true, 0, SCHEME, 0, SCHEME.length())
                ? tokens.bySecret(shown.substring(SCHEME.length()).strip())
                : Optional.empty();
    }

    private Optional<Refusal> otherSite(String named, Token token) {
        if (named == null || named.isBlank()) {
            return Optional.empty();
        }
        Optional<Site> site = sites.byCode(named.strip());
        if (site.isEmpty()) {
            return Optional.of(new Refusal(Refusal.Kind.NOT_FOUND, "unknown-site", named.strip()));
        }
        return site.get().id().equals(token.site())
                ? Optional.empty()
                : Optional.of(new Refusal(Refusal.Kind.FORBIDDEN, "other-site", named.strip()));
    }

    private static void letIn(Token token) {
        SecurityContext context = SecurityContextHolder.createEmptyContext();
        context.setAuthentication(
                Caller.program(new Actor(token.site(), token.subject()), token.label(), token.scopes()));
        SecurityContextHolder.setContext(context);
    }
}
