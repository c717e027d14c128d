package org.levelgaze.access;

import jakarta.servlet.http.HttpServletRequest;
import java.util.Objects;
import org.springframework.http.HttpMethod;
import org.springframework.security.web.servlet.util.matcher.PathPatternRequestMatcher;
import org.springframework.security.web.util.matcher.RequestMatcher;

/**
 * One way into the program.
 *
 * @param method how; {@code GET} covers {@code HEAD}
 * @param pattern where, as Spring writes path patterns
 * @param path the same as a matcher
 * @param admission who
 */
record Route(HttpMethod method, String pattern, RequestMatcher path, Admission admission) {

    Route(HttpMethod method, String pattern, Admission admission) {
        this(method, pattern, PathPatternRequestMatcher.withDefaults().matcher(pattern), admission);
    }

    boolean matches(HttpServletRequest request) {
        return matchesMethod(request) && path.matches(request);
    }

    /** A link that is checked before it is shown has no method: it is opened by {@code GET}. */
    private boolean matchesMethod(HttpServletRequest request) {
        String asked = Objects.requireNonNullElse(request.getMethod(), "GET");
        return method.name().equals("HEAD".equals(asked) ? "GET" : asked);
    }
}
