package org.levelgaze.site;

import jakarta.servlet.RequestDispatcher;
import jakarta.servlet.http.HttpServletRequest;

/** Tells the API from the pages, also while an error is dispatched. */
final class ApiPaths {

    private ApiPaths() {}

    /** Whether the request came for the API. */
    static boolean isApi(HttpServletRequest request) {
        return path(request).substring(request.getContextPath().length()).startsWith("/api/");
    }

    /** The path that was asked for. */
    static String path(HttpServletRequest request) {
        Object failed = request.getAttribute(RequestDispatcher.ERROR_REQUEST_URI);
        return failed instanceof String path ? path : request.getRequestURI();
    }
}
