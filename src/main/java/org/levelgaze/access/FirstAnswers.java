package org.levelgaze.access;

import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.security.MessageDigest;
import java.time.Clock;
import java.time.Duration;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import org.levelgaze.journal.Actor;
import org.springframework.dao.PessimisticLockingFailureException;
import org.springframework.http.HttpHeaders;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import org.springframework.transaction.annotation.Propagation;
import org.springframework.transaction.annotation.Transactional;
import org.springframework.web.util.ContentCachingResponseWrapper;

/** First answers by their {@code Idempotency-Key}, each token's for itself, kept for a week. */
@Component
class FirstAnswers {

    static final Duration KEPT = Duration.ofDays(7);

    private static final List<String> HEADERS = List.of(HttpHeaders.CONTENT_TYPE, HttpHeaders.LOCATION);

    private final JdbcClient jdbc;
    private final Clock clock;

    FirstAnswers(JdbcClient jdbc, Clock clock) {
        this.jdbc = jdbc;
        this.clock = clock;
    }

    /**
     * Whose key, and which.
     *
     * @param actor a token
     * @param text the key
     */
    record Key(Actor actor, String text) {

        int site() {
            return actor.site().value();
        }

        long token() {
            return Long.parseLong(actor.who().substring("token:".length()));
        }
    }

    /** Another request with this key has been at work for too long to wait on. */
    static final class StillWorking extends RuntimeException {

        private static final long serialVersionUID = 1L;
    }

    /**
     * Takes a key for the request under way. Waits while another request with the same key is at work.
     *
     * @return false when the key already has an answer
     * @throws StillWorking when the other takes longer than half a minute
     */
    @Transactional(propagation = Propagation.MANDATORY)
    public boolean reserve(Key key) {
        OffsetDateTime now = OffsetDateTime.now(clock);
        jdbc.sql("""
                delete from first_answer where site_id = ? and token_id = ? and answered_at < ?""").params(key.site(), key.token(), now.minus(KEPT)).update();
        jdbc.sql("set local lock_timeout = '30s'").update();
        try {
            int inserted = jdbc.sql("""
                    insert into first_answer (site_id, token_id, idempotency_key, answered_at)
                    values (?, ?, ?, ?) on conflict do nothing""")
                    .params(key.site(), key.token(), key.text(), now)
                    .update();
            jdbc.sql("set local lock_timeout to default").update();
            return inserted == 1;
        } catch (PessimisticLockingFailureException e) {
            throw new StillWorking();
        }
    }

    /** Keeps the answer to the request under way. */
    @Transactional(propagation = Propagation.MANDATORY)
    public void keep(Key key, byte[] request, Answer answer) {
        jdbc.sql("""
                update first_answer set request_digest = :request, status = :status, headers = :headers, body = :body
                where site_id = :site and token_id = :token and idempotency_key = :key""")
                .param("request", request)
                .param("status", answer.status())
                .param("headers", answer.headers())
                .param("body", answer.body())
                .param("site", key.site())
                .param("token", key.token())
                .param("key", key.text())
                .update();
    }

    /** What was answered to this key. */
    @Transactional(propagation = Propagation.MANDATORY)
    public Optional<Stored> find(Key key) {
        return jdbc.sql("""
                select request_digest, status, headers, body from first_answer
                where site_id = ? and token_id = ? and idempotency_key = ?""")
                .params(key.site(), key.token(), key.text())
                .query((row, number) -> new Stored(
                        row.getBytes("request_digest"),
                        new Answer(row.getInt("status"), row.getString("headers"), row.getBytes("body"))))
                .optional();
    }

    /**
     * A kept answer and what it was given to.
     *
     * @param request the digest of the request
     * @param answer the answer
     */
    @SuppressWarnings("ArrayRecordComponent")
    record Stored(byte[] request, Answer answer) {

        boolean isFor(byte[] other) {
            return MessageDigest.isEqual(request, other);
        }
    }

    /**
     * An answer as it can be given again.
     *
     * @param status its status
     * @param headers its type and location, a line each
     * @param body its body
     */
    @SuppressWarnings("ArrayRecordComponent")
    record Answer(int status, String headers, byte[] body) {

        static Answer of(ContentCachingResponseWrapper response) {
            String headers = HEADERS.stream()
                    .filter(name -> header(response, name).isPresent())
                    .map(name -> name + ": " + header(response, name).orElseThrow())
                    .collect(Collectors.joining("\n"));
            return new Answer(response.getStatus(), headers, response.getContentAsByteArray());
        }

        void writeTo(HttpServletResponse response) throws IOException {
            response.setStatus(status);
            headers.lines().forEach(line -> {
                String[] parts = line.split(": ", 2);
                response.setHeader(parts[0], parts[1]);
            });
            response.getOutputStream().write(body);
        }

        private static Optional<String> header(HttpServletResponse response, String name) {
            return Optional.ofNullable(
                    HttpHeaders.CONTENT_TYPE.equals(name) ? response.getContentType() : response.getHeader(name));
        }
    }
}
