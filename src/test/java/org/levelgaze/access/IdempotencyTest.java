package org.levelgaze.access;

import static java.nio.charset.StandardCharsets.UTF_8;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatExceptionOfType;

import jakarta.servlet.FilterChain;
import jakarta.servlet.ServletInputStream;
import jakarta.servlet.ServletRequest;
import jakarta.servlet.ServletResponse;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.Set;
import java.util.UUID;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.levelgaze.journal.Act;
import org.levelgaze.journal.Actor;
import org.levelgaze.journal.Journal;
import org.levelgaze.journal.JournalEntry;
import org.levelgaze.shared.SiteId;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.mock.web.DelegatingServletInputStream;
import org.springframework.mock.web.MockHttpServletRequest;
import org.springframework.mock.web.MockHttpServletResponse;
import org.springframework.security.core.context.SecurityContextHolder;
import org.springframework.transaction.support.TransactionTemplate;

/** The filter around an invented action that journals a mug and answers with its number. */
@SpringBootTest
@WithDatabase
class IdempotencyTest {

    private static final AtomicInteger MUGS = new AtomicInteger();

    @Autowired
    IdempotencyFilter filter;

    @Autowired
    Tokens tokens;

    @Autowired
    Journal journal;

    @Autowired
    JdbcClient jdbc;

    @Autowired
    TransactionTemplate transaction;

    @Autowired
    RefusedRequests refused;

    @Autowired
    Clock clock;

    private final String key = UUID.randomUUID().toString();
    private final String mug = "mug:" + UUID.randomUUID();
    private Token token = anyToken();

    @BeforeEach
    void aProgramOfItsOwn() {
        token = anotherToken();
    }

    @AfterEach
    void nobody() {
        SecurityContextHolder.clearContext();
    }

    @Test
    void theSameKeyAndBodyAnswerTheFirstAnswerAgainAndActOnce() throws Exception {
        MockHttpServletResponse first = post("a mug", this::makeAMug);
        MockHttpServletResponse second = post("a mug", this::makeAMug);

        assertThat(first.getStatus()).isEqualTo(201);
        assertThat(first.getHeader("Location")).startsWith("/mugs/");
        assertThat(second.getStatus()).isEqualTo(201);
        assertThat(second.getHeader("Location")).isEqualTo(first.getHeader("Location"));
        assertThat(second.getContentType()).isEqualTo(first.getContentType()).startsWith("application/json");
        assertThat(second.getContentAsByteArray()).isEqualTo(first.getContentAsByteArray());
        assertThat(made()).isEqualTo(1);
    }

    @Test
    void theSameKeyWithAnotherBodyIsRefused() throws Exception {
        post("a mug", this::makeAMug);
        MockHttpServletResponse other = post("a bowl", this::makeAMug);

        assertThat(other.getStatus()).isEqualTo(409);
        assertThat(other.getContentType()).isEqualTo("application/problem+json");
        assertThat(other.getContentAsString(UTF_8)).contains("/problems/idempotency-key-reused", key);
        assertThat(made()).isEqualTo(1);
    }

    @Test
    void aBodyThatNobodyReadCountsAllTheSame() throws Exception {
        FilterChain deaf = (request, response) -> respond((HttpServletResponse) response, 201, "x");
        post("a mug", deaf);
        assertThat(post("a mug", deaf).getStatus()).isEqualTo(201);
        assertThat(post("a bowl", deaf).getStatus()).isEqualTo(409);
    }

    @Test
    void theSameKeyAtAnotherAddressIsRefused() throws Exception {
        post("a mug", this::makeAMug);
        MockHttpServletRequest elsewhere = request("a mug");
        elsewhere.setQueryString("task=GLAZE");
        assertThat(send(elsewhere, this::makeAMug).getStatus()).isEqualTo(409);
    }

    @Test
    void withoutAKeyEveryRequestActs() throws Exception {
        for (int i = 0; i < 2; i++) {
            MockHttpServletRequest plain = request("a mug");
            plain.removeHeader("Idempotency-Key");
            transaction.executeWithoutResult(status -> sendUnchecked(plain));
        }
        assertThat(made()).isEqualTo(2);
    }

    @Test
    void aRefusalIsNotKeptAndLeavesNothing() throws Exception {
        MockHttpServletResponse refusal = post("a mug", (request, response) -> {
            journal.record(token.actor(), Act.of("mug.made", mug, ""));
            respond((HttpServletResponse) response, 422, "cracked");
        });
        assertThat(refusal.getStatus()).isEqualTo(422);
        assertThat(refusal.getContentAsString(UTF_8)).isEqualTo("cracked");
        assertThat(made()).isZero();

        assertThat(post("a mug", this::makeAMug).getStatus()).isEqualTo(201);
        assertThat(made()).isEqualTo(1);
    }

    @Test
    void aFailureIsNotKeptAndLeavesNothing() throws Exception {
        assertThatExceptionOfType(IOException.class)
                .isThrownBy(() -> post("a mug", (request, response) -> {
                    journal.record(token.actor(), Act.of("mug.made", mug, ""));
                    throw new IOException("the kiln went cold");
                }));
        assertThat(made()).isZero();
        assertThat(post("a mug", this::makeAMug).getStatus()).isEqualTo(201);
    }

    @Test
    void manyAtTheSameTimeActOnceAndAllGetThatAnswer() throws Exception {
        ExecutorService threads = Executors.newFixedThreadPool(6);
        Callable<String> one = () -> post("a mug", this::makeAMug).getContentAsString(UTF_8);
        List<String> answers = new ArrayList<>();
        for (Future<String> each : threads.invokeAll(Collections.nCopies(6, one))) {
            answers.add(each.get());
        }
        threads.shutdown();
        assertThat(Set.copyOf(answers)).hasSize(1);
        assertThat(made()).isEqualTo(1);
    }

    @Test
    void eachTokenHasItsOwnKeys() throws Exception {
        post("a mug", this::makeAMug);
        token = anotherToken();
        assertThat(post("a bowl", this::makeAMug).getStatus()).isEqualTo(201);
        assertThat(made()).isEqualTo(2);
    }

    @Test
    void afterAWeekTheKeyIsFree() throws Exception {
        post("a mug", this::makeAMug);
        assertThat(post(after(FirstAnswers.KEPT), "a bowl").getStatus()).isEqualTo(409);
        assertThat(post(after(FirstAnswers.KEPT.plusMinutes(1)), "a bowl").getStatus())
                .isEqualTo(201);
    }

    @Test
    void aFormIsNotTakenWithAKeySinceTheServerReadsItPastTheDigest() throws Exception {
        MockHttpServletRequest form = request("a=mug");
        form.setContentType("application/x-www-form-urlencoded; charset=UTF-8");
        assertThat(send(form, this::makeAMug).getStatus()).isEqualTo(415);
    }

    @Test
    void aKeyThatNobodyCanReadIsRefused() throws Exception {
        for (String unreadable : List.of("k".repeat(256), "kéy", "two words", " ")) {
            MockHttpServletRequest sent = request("a mug");
            sent.removeHeader("Idempotency-Key");
            sent.addHeader("Idempotency-Key", unreadable);
            assertThat(send(sent, this::makeAMug).getStatus()).as(unreadable).isEqualTo(400);
        }
    }

    @Test
    void aBodyOfTwoHundredMegabytesPassesThroughAndIsKeptNowhere() throws Exception {
        Runtime runtime = Runtime.getRuntime();
        FilterChain reader = (request, response) -> {
            long read = request.getInputStream().transferTo(OutputStream.nullOutputStream());
            System.gc();
            long used = runtime.totalMemory() - runtime.freeMemory();
            respond((HttpServletResponse) response, 201, read + (used < 400_000_000 ? " little" : " much"));
        };
        MockHttpServletRequest large = new MockHttpServletRequest("POST", "/api/v1/mugs") {
            @Override
            public ServletInputStream getInputStream() {
                return new DelegatingServletInputStream(zeros(200_000_000));
            }
        };
        large.addHeader("Idempotency-Key", key);
        assertThat(send(large, reader).getContentAsString(UTF_8)).isEqualTo("200000000 little");
    }

    private void makeAMug(ServletRequest request, ServletResponse response) throws IOException {
        request.getInputStream().read();
        journal.record(token.actor(), Act.of("mug.made", mug, ""));
        int number = MUGS.incrementAndGet();
        ((HttpServletResponse) response).setHeader("Location", "/mugs/" + number);
        respond((HttpServletResponse) response, 201, "{\"id\":" + number + ",\"glaze\":\"grün\"}");
    }

    private static void respond(HttpServletResponse response, int status, String body) throws IOException {
        response.setStatus(status);
        response.setContentType("application/json");
        response.getOutputStream().write(body.getBytes(UTF_8));
    }

    private MockHttpServletResponse post(String body, FilterChain chain) throws Exception {
        return send(request(body), chain);
    }

    private MockHttpServletResponse post(IdempotencyFilter later, String body) throws Exception {
        return send(later, request(body), this::makeAMug);
    }

    private MockHttpServletResponse send(MockHttpServletRequest request, FilterChain chain) throws Exception {
        return send(filter, request, chain);
    }

    private void sendUnchecked(MockHttpServletRequest request) {
        try {
            send(request, this::makeAMug);
        } catch (Exception e) {
            throw new IllegalStateException(e);
        }
    }

    private MockHttpServletResponse send(IdempotencyFilter with, MockHttpServletRequest request, FilterChain chain)
            throws Exception {
        SecurityContextHolder.getContext()
                .setAuthentication(Caller.program(token.actor(), token.label(), token.scopes()));
        MockHttpServletResponse response = new MockHttpServletResponse();
        with.doFilter(request, response, chain);
        return response;
    }

    private MockHttpServletRequest request(String body) {
        MockHttpServletRequest request = new MockHttpServletRequest("POST", "/api/v1/mugs");
        request.setContentType("application/json");
        request.setContent(body.getBytes(UTF_8));
        request.addHeader("Idempotency-Key", key);
        return request;
    }

    private IdempotencyFilter after(Duration time) {
        return new IdempotencyFilter(
                new FirstAnswers(jdbc, Clock.offset(clock, time.minusSeconds(30))), transaction, refused);
    }

    private long made() {
        long first = Math.max(0, journal.verify(SiteId.MAIN).entries() - 200);
        return journal.after(SiteId.MAIN, first, 300).stream()
                .map(JournalEntry::subject)
                .filter(mug::equals)
                .count();
    }

    private static InputStream zeros(long length) {
        return new InputStream() {
            private long left = length;

            @Override
            public int read() {
                return left-- > 0 ? 0 : -1;
            }

            @Override
            public int read(byte[] into, int from, int wanted) {
                int count = (int) Math.min(left, wanted);
                if (count <= 0) {
                    return -1;
                }
                Arrays.fill(into, from, from + count, (byte) 0);
                left -= count;
                return count;
            }
        };
    }

    private Token anotherToken() {
        return tokens.create(Actor.system(SiteId.MAIN), "Kiln", Set.of(Scope.WRITE))
                .token();
    }

    private static Token anyToken() {
        return new Token(SiteId.MAIN, 1, "Kiln", Set.of(Scope.WRITE), Instant.EPOCH, null, null);
    }
}
