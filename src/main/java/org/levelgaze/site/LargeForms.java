package org.levelgaze.site;

import jakarta.servlet.FilterChain;
import jakarta.servlet.RequestDispatcher;
import jakarta.servlet.ServletException;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletRequestWrapper;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.util.Collections;
import java.util.Enumeration;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.boot.security.autoconfigure.web.servlet.SecurityFilterProperties;
import org.springframework.core.annotation.Order;
import org.springframework.http.HttpMethod;
import org.springframework.http.HttpStatus;
import org.springframework.stereotype.Component;
import org.springframework.util.unit.DataSize;
import org.springframework.web.filter.OncePerRequestFilter;

/**
 * Answers a form whose file is too large with the page that says so, before anything asks for the form's fields: the server
 * would read the whole of it to find them, and then answer with a page of its own.
 */
@Component
@Order(SecurityFilterProperties.DEFAULT_FILTER_ORDER - 1)
class LargeForms extends OncePerRequestFilter {

    private final DataSize largest;

    LargeForms(@Value("${spring.servlet.multipart.max-request-size}") DataSize largest) {
        this.largest = largest;
    }

    @Override
    protected boolean shouldNotFilter(HttpServletRequest request) {
        String type = request.getContentType();
        boolean carriesFiles = type != null && type.startsWith("multipart/");
        return !carriesFiles || request.getContentLengthLong() <= largest.toBytes();
    }

    @Override
    protected void doFilterInternal(HttpServletRequest request, HttpServletResponse response, FilterChain chain)
            throws ServletException, IOException {
        request.setAttribute(RequestDispatcher.ERROR_STATUS_CODE, HttpStatus.CONTENT_TOO_LARGE.value());
        request.setAttribute(RequestDispatcher.ERROR_REQUEST_URI, request.getRequestURI());
        request.getRequestDispatcher("/error").forward(new Unread(request), response);
    }

    /** The request as if it carried nothing. */
    private static final class Unread extends HttpServletRequestWrapper {

        Unread(HttpServletRequest request) {
            super(request);
        }

        @Override
        public String getMethod() {
            return HttpMethod.GET.name();
        }

        @Override
        public @Nullable String getContentType() {
            return null;
        }

        @Override
        public @Nullable String getParameter(String name) {
            return null;
        }

        @Override
        public String @Nullable [] getParameterValues(String name) {
            return null;
        }

        @Override
        public Map<String, String[]> getParameterMap() {
            return Map.of();
        }

        @Override
        public Enumeration<String> getParameterNames() {
            return Collections.emptyEnumeration();
        }
    }
}
