package org.levelgaze;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.net.CookieManager;
import java.net.HttpCookie;
import java.net.Socket;
import java.net.URI;
import java.net.URLEncoder;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpRequest.BodyPublishers;
import java.net.http.HttpResponse;
import java.net.http.HttpResponse.BodyHandlers;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Iterator;
import java.util.Map;
import java.util.Objects;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.levelgaze.testing.RunningProgram;

/** Large files against the running program, in little memory and over real HTTP. */
class LargeFilesTest {

    private static final int ROWS = 1_000_000;
    private static final int FEWER = 50_000;
    private static final long TWO_GIGABYTES = 2L << 30;
    private static final String STUDY = "/api/v1/studies?task=RIM&performedOn=2026-03-02&create=true&set=";

    @TempDir
    static Path folder;

    private static @Nullable RunningProgram started;

    @BeforeAll
    static void start() throws Exception {
        started = RunningProgram.start(folder.resolve("home"), "-Xmx256m");
        program()
                .post(
                        "/api/v1/tasks",
                        "application/json",
                        BodyPublishers.ofString("{\"code\":\"RIM\",\"name\":\"Rim\"}"));
    }

    @AfterAll
    static void stop() {
        program().close();
    }

    private static RunningProgram program() {
        return Objects.requireNonNull(started);
    }

    @Test
    void takesAMillionCallsIn256MegabytesOfMemory() throws Exception {
        HttpResponse<String> answer =
                program().post(STUDY + "MILLION", "text/csv", BodyPublishers.ofInputStream(() -> lines(ROWS, ROWS)));

        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(201);
        assertThat(answer.body()).contains("\"calls\":" + ROWS, "\"pieces\":200000");
        assertThat(program().log()).doesNotContain("OutOfMemoryError");
    }

    @Test
    void namesEveryBadRowOfALargeBodyAndKeepsNothing() throws Exception {
        HttpResponse<String> answer = program()
                .post(STUDY + "BAD", "text/csv", BodyPublishers.ofInputStream(() -> lines(FEWER, FEWER - 300)));

        assertThat(answer.statusCode()).isEqualTo(422);
        assertThat(answer.headers().firstValue("Content-Type")).hasValue("application/problem+json");
        assertThat(answer.body())
                .contains("\"type\":\"/problems/bad-rows\"", "\"rowsInAll\":300", "\"row\":" + (FEWER + 1))
                .contains("\"column\":\"call\"", "\"value\":\"maybe\"");
        assertThat(answer.body().split("\"row\":", -1)).hasSize(301);
        assertThat(program().get("/api/v1/sets").body()).doesNotContain("BAD");
        assertThat(program().get("/api/v1/appraisers").body()).doesNotContain("BAD");
    }

    @Test
    void refusesABodyOfTwoGigabytesByItsLengthAlone() throws Exception {
        String answer = announce(STUDY + "HUGE", "text/csv", "Authorization: Bearer " + RunningProgram.TOKEN, "", "}");

        assertThat(answer).startsWith("HTTP/1.1 413").contains("/problems/upload-too-large", "larger than 200 MB");
    }

    @Test
    void refusesABodyWithoutALengthOnceItIsTooLarge() throws Exception {
        String note = "n".repeat(900);
        Iterator<String> lines = IntStream.range(0, 300_000)
                .mapToObj(row -> row == 0
                        ? "piece,reference,appraiser,trial,call,note\n"
                        : "P1,good,A,%d,accept,%s\n".formatted(row, note))
                .iterator();

        HttpResponse<String> answer =
                program().post(STUDY + "ENDLESS", "text/csv", BodyPublishers.ofInputStream(() -> new Lines(lines)));

        assertThat(answer.statusCode()).as(answer.body()).isEqualTo(413);
        assertThat(answer.body()).contains("/problems/upload-too-large", "larger than 200 MB");
    }

    @Test
    void tellsABrowserThatAFileOfTwoGigabytesIsTooLarge() throws Exception {
        CookieManager cookies = new CookieManager();
        HttpClient browser = HttpClient.newBuilder().cookieHandler(cookies).build();
        setUp(browser);
        String page = browser.send(
                        HttpRequest.newBuilder(program().uri("/studies/import")).build(), BodyHandlers.ofString())
                .body();
        assertThat(page).contains("data-largest=\"209715200\"");
        String session = cookies.getCookieStore().getCookies().stream()
                .map(HttpCookie::toString)
                .collect(Collectors.joining("; "));
        String part = "--x\r\nContent-Disposition: form-data; name=\"_csrf\"\r\n\r\n" + formToken(page) + "\r\n";

        String answer =
                announce("/studies/import", "multipart/form-data; boundary=x", "Cookie: " + session, part, "</html>");

        assertThat(answer).startsWith("HTTP/1.1 413").contains("This file is too large", "Split the file");
    }

    /** Sends the head of a request that announces two gigabytes, the beginning of its body, and reads what is answered. */
    private static String announce(String path, String type, String header, String beginning, String end)
            throws IOException {
        URI place = program().uri(path);
        try (Socket socket = new Socket(place.getHost(), place.getPort())) {
            socket.setSoTimeout(60_000);
            OutputStream out = socket.getOutputStream();
            String head = "POST " + path + " HTTP/1.1\r\nHost: localhost\r\n" + header + "\r\nContent-Type: " + type
                    + "\r\nContent-Length: " + TWO_GIGABYTES + "\r\n\r\n" + beginning;
            out.write(head.getBytes(StandardCharsets.UTF_8));
            out.flush();
            return firstAnswer(socket.getInputStream(), end);
        }
    }

    private static String firstAnswer(InputStream in, String end) throws IOException {
        StringBuilder answer = new StringBuilder();
        byte[] buffer = new byte[1 << 16];
        int got = in.read(buffer);
        while (got > 0) {
            answer.append(new String(buffer, 0, got, StandardCharsets.UTF_8));
            got = answer.indexOf(end) >= 0 ? -1 : in.read(buffer);
        }
        return answer.toString();
    }

    private static void setUp(HttpClient browser) throws Exception {
        Matcher code = Pattern.compile("[A-Z0-9]{4}(-[A-Z0-9]{4}){3}")
                .matcher(program().log());
        assertThat(code.find()).as(program().log()).isTrue();
        post(
                browser,
                "/setup",
                Map.of(
                        "code", code.group(),
                        "displayName", "Ana Tarn",
                        "loginName", "ana",
                        "password", "glaze over slip over clay",
                        "repeated", "glaze over slip over clay"));
    }

    private static void post(HttpClient browser, String path, Map<String, String> fields) throws Exception {
        String page = browser.send(HttpRequest.newBuilder(program().uri(path)).build(), BodyHandlers.ofString())
                .body();
        String body = "_csrf=" + URLEncoder.encode(formToken(page), StandardCharsets.UTF_8) + "&"
                + fields.entrySet().stream()
                        .map(field ->
                                field.getKey() + "=" + URLEncoder.encode(field.getValue(), StandardCharsets.UTF_8))
                        .collect(Collectors.joining("&"));
        HttpRequest request = HttpRequest.newBuilder(program().uri(path))
                .header("Content-Type", "application/x-www-form-urlencoded")
                .POST(BodyPublishers.ofString(body))
                .build();
        assertThat(browser.send(request, BodyHandlers.ofString()).statusCode()).isEqualTo(302);
    }

    private static String formToken(String page) {
        Matcher token = Pattern.compile("name=\"_csrf\" value=\"([^\"]+)\"").matcher(page);
        assertThat(token.find()).as(page).isTrue();
        return token.group(1);
    }

    /** A file of five appraisers on as many pieces as are needed, written while it is read; bad from some row on. */
    private static InputStream lines(int rows, int badFrom) {
        Stream<String> lines = IntStream.range(0, rows)
                .mapToObj(
                        row -> "P" + row / 5 + ",good,A" + row % 5 + ",1," + (row < badFrom ? "accept\n" : "maybe\n"));
        return new Lines(Stream.concat(Stream.of("piece,reference,appraiser,trial,call\n"), lines)
                .iterator());
    }

    private static final class Lines extends InputStream {

        private final Iterator<String> lines;
        private byte[] line = new byte[0];
        private int at;

        Lines(Iterator<String> lines) {
            this.lines = lines;
        }

        @Override
        public int read() {
            byte[] one = new byte[1];
            return read(one, 0, 1) < 0 ? -1 : one[0] & 0xff;
        }

        @Override
        public int read(byte[] target, int offset, int length) {
            int filled = 0;
            while (filled < length && (at < line.length || lines.hasNext())) {
                if (at == line.length) {
                    line = lines.next().getBytes(StandardCharsets.UTF_8);
                    at = 0;
                }
                int taken = Math.min(length - filled, line.length - at);
                System.arraycopy(line, at, target, offset + filled, taken);
                at += taken;
                filled += taken;
            }
            return filled == 0 && length > 0 ? -1 : filled;
        }
    }
}
