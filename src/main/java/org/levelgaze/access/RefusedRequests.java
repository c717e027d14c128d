package org.levelgaze.access;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.util.Set;
import java.util.stream.Collectors;
import org.levelgaze.shared.Refusal;
import org.springframework.beans.factory.annotation.Qualifier;
import org.springframework.http.HttpHeaders;
import org.springframework.http.HttpMethod;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.security.access.AccessDeniedException;
import org.springframework.security.core.AuthenticationException;
import org.springframework.security.web.AuthenticationEntryPoint;
import org.springframework.security.web.access.AccessDeniedHandler;
import org.springframework.security.web.csrf.CsrfException;
import org.springframework.stereotype.Component;
import org.springframework.web.server.ResponseStatusException;
import org.springframework.web.servlet.DispatcherServlet;
import org.springframework.web.servlet.HandlerExceptionResolver;
import org.springframework.web.servlet.LocaleResolver;

/**
 * Answers requests that go no further: people are shown where to sign in, programs get problem details in the form that the
 * rest of the API uses.
 */
@Component
class RefusedRequests implements AuthenticationEntryPoint, AccessDeniedHandler {

    private static final Set<String> FORMS_BEFORE_SIGN_IN = Set.of("/sign-in", "/setup", "/sign-out");

    private final FirstSetup setup;
    private final HandlerExceptionResolver problems;
    private final LocaleResolver languages;

    RefusedRequests(
            FirstSetup setup,
            @Qualifier("handlerExceptionResolver") HandlerExceptionResolver problems,
            LocaleResolver languages) {
        this.setup = setup;
        this.problems = problems;
        this.languages = languages;
    }

    /** Nobody is known: to the sign-in, or before there is any account to the set-up. */
    @Override
    public void commence(HttpServletRequest request, HttpServletResponse response, AuthenticationException why)
            throws IOException {
        if (isForPrograms(request)) {
            answerUnknown(request, response);
        } else if (request.getHeader("HX-Request") != null) {
            response.setHeader("HX-Redirect", request.getContextPath() + door());
            response.setStatus(HttpStatus.UNAUTHORIZED.value());
        } else {
            response.sendRedirect(request.getContextPath() + door());
        }
    }

    /** Somebody is known who may not, or the address is nobody's. */
    @Override
    public void handle(HttpServletRequest request, HttpServletResponse response, AccessDeniedException why)
            throws IOException {
        String path = path(request);
        Set<HttpMethod> methods = Routes.methodsAt(request);
        if (why instanceof CsrfException) {
            staleForm(path, request, response);
        } else if (methods.isEmpty()) {
            answer(request, response, new ResponseStatusException(HttpStatus.NOT_FOUND));
        } else if (Routes.of(request).isEmpty()) {
            response.setHeader(
                    HttpHeaders.ALLOW, methods.stream().map(HttpMethod::name).collect(Collectors.joining(", ")));
            answer(request, response, new ResponseStatusException(HttpStatus.METHOD_NOT_ALLOWED));
        } else {
            String scopes = Routes.of(request).orElseThrow().admission().scopes();
            answer(request, response, new Refusal(Refusal.Kind.FORBIDDEN, "missing-scope", scopes));
        }
    }

    /** A token that is missing, mistyped, unknown or revoked: one answer for all. */
    void answerUnknown(HttpServletRequest request, HttpServletResponse response) throws IOException {
        response.setHeader(HttpHeaders.WWW_AUTHENTICATE, "Bearer");
        answer(request, response, new ResponseStatusException(HttpStatus.UNAUTHORIZED));
    }

    /** Problem details under {@code /api}, the page of the status elsewhere. */
    void answer(HttpServletRequest request, HttpServletResponse response, RuntimeException why) throws IOException {
        request.setAttribute(DispatcherServlet.LOCALE_RESOLVER_ATTRIBUTE, languages);
        boolean answered =
                path(request).startsWith("/api/") && problems.resolveException(request, response, null, why) != null;
        if (!answered) {
            response.sendError(
                    why instanceof ResponseStatusException status
                            ? status.getStatusCode().value()
                            : HttpStatus.FORBIDDEN.value());
        }
    }

    /** A form that was open longer than its session is shown anew when it is the one to sign in. */
    private static void staleForm(String path, HttpServletRequest request, HttpServletResponse response)
            throws IOException {
        if (FORMS_BEFORE_SIGN_IN.contains(path)) {
            response.sendRedirect(request.getContextPath() + ("/setup".equals(path) ? path : "/sign-in?after=stale"));
        } else {
            response.sendError(HttpStatus.FORBIDDEN.value());
        }
    }

    private String door() {
        return setup.isDone() ? "/sign-in" : "/setup";
    }

    private static boolean isForPrograms(HttpServletRequest request) {
        String path = path(request);
        String accept = request.getHeader(HttpHeaders.ACCEPT);
        boolean page = "/api".equals(path) && accept != null && accept.contains(MediaType.TEXT_HTML_VALUE);
        return !page && (path.equals("/api") || path.startsWith("/api/") || path.startsWith("/actuator"));
    }

    private static String path(HttpServletRequest request) {
        return request.getRequestURI().substring(request.getContextPath().length());
    }
}
