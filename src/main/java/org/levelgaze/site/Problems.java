package org.levelgaze.site;

import jakarta.servlet.http.HttpServletRequest;
import java.net.URI;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.RowError;
import org.springframework.http.HttpStatus;
import org.springframework.http.HttpStatusCode;
import org.springframework.http.MediaType;
import org.springframework.http.ProblemDetail;
import org.springframework.http.ResponseEntity;
import org.springframework.stereotype.Component;
import org.springframework.validation.BindingResult;

/** Writes problem details (RFC 9457), the answers of the API to what it does not take. */
@Component
class Problems {

    private final Sentences words;

    Problems(Sentences words) {
        this.words = words;
    }

    static HttpStatus status(Refusal.Kind kind) {
        return switch (kind) {
            case MALFORMED -> HttpStatus.BAD_REQUEST;
            case FORBIDDEN -> HttpStatus.FORBIDDEN;
            case NOT_FOUND -> HttpStatus.NOT_FOUND;
            case CONFLICT -> HttpStatus.CONFLICT;
            case INVALID -> HttpStatus.UNPROCESSABLE_CONTENT;
            case TOO_LARGE -> HttpStatus.CONTENT_TOO_LARGE;
            case TOO_MANY -> HttpStatus.TOO_MANY_REQUESTS;
        };
    }

    ResponseEntity<ProblemDetail> of(Refusal refusal, Locale locale) {
        ProblemDetail problem =
                problem(status(refusal.kind()), refusal.type(), words.sentence(refusal, locale), locale);
        if (!refusal.rows().isEmpty()) {
            problem.setProperty(
                    "errors",
                    refusal.rows().stream().map(row -> badRow(row, locale)).toList());
            problem.setProperty("rowsInAll", refusal.rowsInAll());
        }
        return answer(problem);
    }

    /** A failure that has no more than a status. */
    ResponseEntity<ProblemDetail> ofStatus(HttpStatusCode status, HttpServletRequest request, Locale locale) {
        String type = type(status);
        Object argument = switch (type) {
            case "method-not-allowed" -> request.getMethod();
            case "unsupported-media-type" -> Objects.requireNonNullElse(request.getContentType(), "?");
            case "failed" -> request.getRequestId();
            default -> ApiPaths.path(request);
        };
        return answer(problem(status, type, own(type, List.of(argument), locale), locale));
    }

    /** A body whose fields break rules. */
    ResponseEntity<ProblemDetail> ofFields(BindingResult result, Locale locale) {
        ProblemDetail problem =
                problem(HttpStatus.UNPROCESSABLE_CONTENT, "invalid", own("invalid", List.of(), locale), locale);
        problem.setProperty(
                "fields",
                result.getFieldErrors().stream()
                        .map(fault -> new BadField(fault.getField(), words.sentence(fault, locale)))
                        .toList());
        return answer(problem);
    }

    private static String type(HttpStatusCode status) {
        return switch (status.value()) {
            case 400 -> "malformed";
            case 401 -> "unauthorized";
            case 403 -> "forbidden";
            case 404 -> "not-found";
            case 405 -> "method-not-allowed";
            case 406 -> "not-acceptable";
            case 413 -> "too-large";
            case 415 -> "unsupported-media-type";
            default -> status.is5xxServerError() ? "failed" : "other";
        };
    }

    private String own(String type, List<?> arguments, Locale locale) {
        return words.sentence("site.problem." + type, arguments, locale);
    }

    private ProblemDetail problem(HttpStatusCode status, String type, String detail, Locale locale) {
        ProblemDetail problem = ProblemDetail.forStatusAndDetail(status, detail);
        problem.setType(URI.create("/problems/" + type));
        problem.setTitle(words.title(status.value(), locale));
        return problem;
    }

    private BadRow badRow(RowError row, Locale locale) {
        return new BadRow(row.row(), row.column(), row.value(), words.sentence(row, locale));
    }

    private static ResponseEntity<ProblemDetail> answer(ProblemDetail problem) {
        return ResponseEntity.status(problem.getStatus())
                .contentType(MediaType.APPLICATION_PROBLEM_JSON)
                .body(problem);
    }

    /** One bad field as the API writes it. */
    record BadField(String field, String message) {}

    /** One bad row as the API writes it. */
    record BadRow(long row, String column, String value, String message) {}
}
