package org.levelgaze.access;

import jakarta.servlet.FilterChain;
import jakarta.servlet.ServletException;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.util.Optional;
import java.util.regex.Pattern;
import org.levelgaze.shared.Refusal;
import org.springframework.http.HttpStatus;
import org.springframework.http.HttpStatusCode;
import org.springframework.http.MediaType;
import org.springframework.security.core.Authentication;
import org.springframework.security.core.context.SecurityContextHolder;
import org.springframework.stereotype.Component;
import org.springframework.transaction.TransactionStatus;
import org.springframework.transaction.support.TransactionTemplate;
import org.springframework.web.filter.OncePerRequestFilter;
import org.springframework.web.server.ResponseStatusException;
import org.springframework.web.util.ContentCachingResponseWrapper;

/**
 * Makes a POST with an {@code Idempotency-Key} safe to send again: the same key and request get the first answer, the same
 * key with another request is refused. The whole request runs in one transaction, in which its answer is stored too, so that
 * neither stands without the other. Only answers of 2xx are kept; anything else leaves nothing and may be tried anew.
 */
@Component
class IdempotencyFilter extends OncePerRequestFilter {

    private static final String HEADER = "Idempotency-Key";
    private static final Pattern KEY = Pattern.compile("[\\x21-\\x7e]{1,255}");

    private final FirstAnswers answers;
    private final TransactionTemplate transaction;
    private final RefusedRequests refused;

    IdempotencyFilter(FirstAnswers answers, TransactionTemplate transaction, RefusedRequests refused) {
        this.answers = answers;
        this.transaction = transaction;
        this.refused = refused;
    }

    @Override
    protected boolean shouldNotFilter(HttpServletRequest request) {
        return !"POST".equals(request.getMethod()) || request.getHeader(HEADER) == null;
    }

    @Override
    protected void doFilterInternal(HttpServletRequest request, HttpServletResponse response, FilterChain chain)
            throws ServletException, IOException {
        Authentication caller = SecurityContextHolder.getContext().getAuthentication();
        String key = request.getHeader(HEADER).strip();
        if (!KEY.matcher(key).matches()) {
            refused.answer(request, response, new Refusal(Refusal.Kind.MALFORMED, "idempotency-key"));
        } else if (isForm(request)) {
            refused.answer(request, response, new ResponseStatusException(HttpStatus.UNSUPPORTED_MEDIA_TYPE));
        } else if (caller instanceof Caller known) {
            once(new FirstAnswers.Key(known.actor(), key), request, response, chain);
        } else {
            chain.doFilter(request, response);
        }
    }

    private void once(FirstAnswers.Key key, HttpServletRequest request, HttpServletResponse response, FilterChain chain)
            throws ServletException, IOException {
        DigestedRequest digested = new DigestedRequest(request);
        ContentCachingResponseWrapper kept = new ContentCachingResponseWrapper(response);
        try {
            transaction.executeWithoutResult(status -> within(status, key, digested, kept, chain));
        } catch (FirstAnswers.StillWorking e) {
            kept.reset();
            refused.answer(request, kept, new Refusal(Refusal.Kind.CONFLICT, "idempotency-key-in-use", key.text()));
        } catch (ChainFailed e) {
            e.rethrow();
        }
        kept.copyBodyToResponse();
    }

    private void within(
            TransactionStatus status,
            FirstAnswers.Key key,
            DigestedRequest request,
            ContentCachingResponseWrapper response,
            FilterChain chain) {
        try {
            if (answers.reserve(key)) {
                work(status, key, request, response, chain);
            } else {
                repeat(answers.find(key), key, request, response);
            }
        } catch (IOException | ServletException e) {
            throw new ChainFailed(e);
        }
    }

    private void work(
            TransactionStatus status,
            FirstAnswers.Key key,
            DigestedRequest request,
            ContentCachingResponseWrapper response,
            FilterChain chain)
            throws IOException, ServletException {
        chain.doFilter(request, response);
        if (HttpStatusCode.valueOf(response.getStatus()).is2xxSuccessful()) {
            answers.keep(key, request.digest(), FirstAnswers.Answer.of(response));
        } else {
            status.setRollbackOnly();
        }
    }

    private void repeat(
            Optional<FirstAnswers.Stored> stored,
            FirstAnswers.Key key,
            DigestedRequest request,
            ContentCachingResponseWrapper response)
            throws IOException {
        if (stored.isPresent() && stored.get().isFor(request.digest())) {
            stored.get().answer().writeTo(response);
        } else {
            refused.answer(request, response, new Refusal(Refusal.Kind.CONFLICT, "idempotency-key-reused", key.text()));
        }
    }

    /** The server reads forms by itself, past the digest; the API takes none. */
    private static boolean isForm(HttpServletRequest request) {
        String type = request.getContentType();
        return type != null
                && (type.startsWith(MediaType.APPLICATION_FORM_URLENCODED_VALUE) || type.startsWith("multipart/"));
    }

    /** Carries a failure of the rest of the chain out of the transaction. */
    private static final class ChainFailed extends RuntimeException {

        private static final long serialVersionUID = 1L;

        ChainFailed(Exception cause) {
            super(cause);
        }

        void rethrow() throws IOException, ServletException {
            if (getCause() instanceof IOException e) {
                throw e;
            }
            if (getCause() instanceof ServletException e) {
                throw e;
            }
            throw this;
        }
    }
}
