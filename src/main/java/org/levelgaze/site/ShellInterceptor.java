package org.levelgaze.site;

import jakarta.servlet.RequestDispatcher;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.security.Principal;
import java.util.List;
import java.util.Objects;
import org.jspecify.annotations.Nullable;
import org.springframework.beans.factory.ObjectProvider;
import org.springframework.security.core.Authentication;
import org.springframework.security.web.access.WebInvocationPrivilegeEvaluator;
import org.springframework.stereotype.Component;
import org.springframework.web.servlet.HandlerInterceptor;
import org.springframework.web.servlet.support.RequestContextUtils;

/**
 * Puts the {@link Shell} into every request, before anything can go wrong in it, so that error pages have one too. The
 * rules of sign-in say which places a role may open; they are asked, not repeated here.
 */
@Component
class ShellInterceptor implements HandlerInterceptor {

    private final Sentences words;
    private final ObjectProvider<WebInvocationPrivilegeEvaluator> rules;

    ShellInterceptor(Sentences words, ObjectProvider<WebInvocationPrivilegeEvaluator> rules) {
        this.words = words;
        this.rules = rules;
    }

    @Override
    public boolean preHandle(HttpServletRequest request, HttpServletResponse response, Object handler) {
        Principal who = request.getUserPrincipal();
        Shell shell = new Shell(
                words,
                RequestContextUtils.getLocale(request),
                Themes.of(request, response),
                query(request),
                who == null ? null : who.getName(),
                places(who, request.getContextPath()));
        request.setAttribute("shell", shell);
        return true;
    }

    private List<Place> places(@Nullable Principal who, String contextPath) {
        WebInvocationPrivilegeEvaluator evaluator = rules.getIfAvailable();
        if (evaluator == null || !(who instanceof Authentication authentication)) {
            return List.of();
        }
        return Place.ALL.stream()
                .filter(place -> evaluator.isAllowed(contextPath, place.href(), "GET", authentication))
                .toList();
    }

    /** The query that the browser shows, empty without one; in an error dispatch that of the request which failed. */
    private static String query(HttpServletRequest request) {
        Object failed = request.getAttribute(RequestDispatcher.ERROR_QUERY_STRING);
        return failed instanceof String query ? query : Objects.requireNonNullElse(request.getQueryString(), "");
    }
}
