package org.levelgaze.site;

import jakarta.servlet.http.Cookie;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.time.Duration;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.springframework.http.HttpHeaders;
import org.springframework.http.ResponseCookie;
import org.springframework.web.util.WebUtils;

/** Light, dark, or as the device likes it: chosen on a page and kept in a cookie. */
final class Themes {

    /** The parameter that chooses a brightness, and the cookie that keeps it. */
    static final String PARAMETER = "theme";

    private static final String SYSTEM = "system";

    /** The brightnesses there are. */
    static final List<String> OFFERED = List.of(SYSTEM, "light", "dark");

    private Themes() {}

    /** The brightness of this answer; a choice in the request is kept for a year. */
    static String of(HttpServletRequest request, HttpServletResponse response) {
        String chosen = request.getParameter(PARAMETER);
        if (isOffered(chosen)) {
            response.addHeader(HttpHeaders.SET_COOKIE, kept(chosen).toString());
            return chosen;
        }
        Cookie cookie = WebUtils.getCookie(request, PARAMETER);
        return cookie != null && isOffered(cookie.getValue()) ? cookie.getValue() : SYSTEM;
    }

    private static boolean isOffered(@Nullable String theme) {
        return theme != null && OFFERED.contains(theme);
    }

    private static ResponseCookie kept(String theme) {
        return ResponseCookie.from(PARAMETER, theme)
                .path("/")
                .maxAge(Duration.ofDays(365))
                .httpOnly(true)
                .sameSite("Lax")
                .build();
    }
}
