package org.levelgaze.site;

import jakarta.servlet.RequestDispatcher;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.security.Principal;
import java.util.List;
import java.util.Objects;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Component;
import org.springframework.web.servlet.HandlerInterceptor;
import org.springframework.web.servlet.support.RequestContextUtils;

/**
 * Puts the {@link Shell} into every request, before anything can go wrong in it, so that error pages have one too.
 */
@Component
class ShellInterceptor implements HandlerInterceptor {

    private final Sentences words;
    private final Doors doors;

    ShellInterceptor(Sentences words, Doors doors) {
        this.words = words;
        this.doors = doors;
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
                places(who, request.getContextPath()),
                request::isUserInRole);
        request.setAttribute("shell", shell);
        return true;
    }

    private List<Place> places(@Nullable Principal who, String contextPath) {
        return Place.ALL.stream()
                .filter(place -> doors.isOpen(who, contextPath, place.href()))
                .toList();
    }

    /** The query that the browser shows, empty without one; in an error dispatch that of the request which failed. */
    private static String query(HttpServletRequest request) {
        Object failed = request.getAttribute(RequestDispatcher.ERROR_QUERY_STRING);
        return failed instanceof String query ? query : Objects.requireNonNullElse(request.getQueryString(), "");
    }
}
