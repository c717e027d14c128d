package org.levelgaze.site;

import jakarta.servlet.http.HttpServletRequest;
import java.util.Locale;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.beans.TypeMismatchException;
import org.springframework.core.Ordered;
import org.springframework.core.annotation.Order;
import org.springframework.http.HttpStatus;
import org.springframework.http.HttpStatusCode;
import org.springframework.http.ProblemDetail;
import org.springframework.http.ResponseEntity;
import org.springframework.http.converter.HttpMessageNotReadableException;
import org.springframework.security.access.AccessDeniedException;
import org.springframework.security.core.AuthenticationException;
import org.springframework.validation.BindException;
import org.springframework.web.ErrorResponse;
import org.springframework.web.bind.MethodArgumentNotValidException;
import org.springframework.web.bind.annotation.ControllerAdvice;
import org.springframework.web.bind.annotation.ExceptionHandler;

/**
 * Answers whatever else goes wrong under {@code /api} as problem details. Failures of pages, and what sign-in has to
 * answer, go on as they came.
 */
@ControllerAdvice
@Order(Ordered.LOWEST_PRECEDENCE)
class ApiProblems {

    private static final Logger LOG = LoggerFactory.getLogger(ApiProblems.class);

    private final Problems problems;

    ApiProblems(Problems problems) {
        this.problems = problems;
    }

    @ExceptionHandler
    ResponseEntity<ProblemDetail> failed(Exception failure, HttpServletRequest request, Locale locale)
            throws Exception {
        if (!ApiPaths.isApi(request)
                || failure instanceof AccessDeniedException
                || failure instanceof AuthenticationException) {
            throw failure;
        }
        if (failure instanceof MethodArgumentNotValidException invalid) {
            return problems.ofFields(invalid.getBindingResult(), locale);
        }
        HttpStatusCode status = status(failure);
        if (status.is5xxServerError()) {
            LOG.error("Request {} to {} failed", request.getRequestId(), ApiPaths.path(request), failure);
        }
        return problems.ofStatus(status, request, locale);
    }

    private static HttpStatusCode status(Exception failure) {
        if (failure instanceof ErrorResponse response) {
            return response.getStatusCode();
        }
        boolean unreadable = failure instanceof HttpMessageNotReadableException
                || failure instanceof TypeMismatchException
                || failure instanceof BindException;
        return unreadable ? HttpStatus.BAD_REQUEST : HttpStatus.INTERNAL_SERVER_ERROR;
    }
}
