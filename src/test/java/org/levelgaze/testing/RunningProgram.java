package org.levelgaze.testing;

import java.io.IOException;
import java.net.ServerSocket;
import java.net.URI;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpResponse;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.List;
import java.util.concurrent.TimeUnit;

/** The whole program in a process of its own, with a PostgreSQL and a home of its own: it can be killed. */
public final class RunningProgram implements AutoCloseable {

    /** The token that unattended set-up makes; every scope. */
    public static final String TOKEN = "a-token-for-the-tests-alone-0123456789";

    private static final Duration LONGEST_START = Duration.ofMinutes(3);
    private static final Duration BETWEEN_LOOKS = Duration.ofMillis(100);

    private final Process process;
    private final int port;
    private final Path log;
    private final HttpClient http = HttpClient.newHttpClient();

    private RunningProgram(Process process, int port, Path log) {
        this.process = process;
        this.port = port;
        this.log = log;
    }

    /**
     * Starts the program on this home and waits until it is ready.
     *
     * @param home its folder
     * @param jvm options for the virtual machine, such as a limit of its heap
     */
    public static RunningProgram start(Path home, String... jvm) throws IOException, InterruptedException {
        int port = freePort();
        Path log = home.resolveSibling(home.getFileName() + ".log");
        RunningProgram program = new RunningProgram(process(home, port, log, jvm), port, log);
        program.awaitReady();
        return program;
    }

    private static Process process(Path home, int port, Path log, String... jvm) throws IOException {
        ProcessBuilder builder = new ProcessBuilder(
                Path.of(System.getProperty("java.home"), "bin", "java").toString());
        builder.command().addAll(List.of(jvm));
        builder.command()
                .addAll(List.of(
                        "-XX:TieredStopAtLevel=1",
                        "-cp",
                        System.getProperty("java.class.path"),
                        "org.levelgaze.Levelgaze"));
        builder.environment().put("LEVELGAZE_HOME", home.toString());
        builder.environment().put("SERVER_PORT", Integer.toString(port));
        builder.environment().put("LEVELGAZE_BOOTSTRAP_TOKEN", TOKEN);
        builder.redirectErrorStream(true);
        builder.redirectOutput(ProcessBuilder.Redirect.appendTo(log.toFile()));
        return builder.start();
    }

    private void awaitReady() throws IOException, InterruptedException {
        long deadline = System.nanoTime() + LONGEST_START.toNanos();
        while (System.nanoTime() < deadline) {
            if (process.waitFor(BETWEEN_LOOKS.toMillis(), TimeUnit.MILLISECONDS)) {
                throw new IOException("The program ended with " + process.exitValue() + ":\n" + Files.readString(log));
            }
            if (isReady()) {
                return;
            }
        }
        throw new IOException("The program was not ready in time:\n" + Files.readString(log));
    }

    private boolean isReady() throws InterruptedException {
        try {
            HttpRequest health = HttpRequest.newBuilder(uri("/actuator/health")).build();
            return http.send(health, HttpResponse.BodyHandlers.discarding()).statusCode() == 200;
        } catch (IOException notYet) {
            return false;
        }
    }

    /** The address of a path of this program. */
    public URI uri(String path) {
        return URI.create("http://127.0.0.1:" + port + path);
    }

    /** A request with the token. */
    public HttpRequest.Builder request(String path) {
        return HttpRequest.newBuilder(uri(path)).header("Authorization", "Bearer " + TOKEN);
    }

    /** Sends a request and waits for its answer. */
    public HttpResponse<String> send(HttpRequest request) throws IOException, InterruptedException {
        return http.send(request, HttpResponse.BodyHandlers.ofString());
    }

    /** Reads a path with the token. */
    public HttpResponse<String> get(String path) throws IOException, InterruptedException {
        return send(request(path).build());
    }

    /** Posts a body with the token. */
    public HttpResponse<String> post(String path, String type, HttpRequest.BodyPublisher body)
            throws IOException, InterruptedException {
        return send(request(path).header("Content-Type", type).POST(body).build());
    }

    /** Ends the process as kill -9 does: nothing of the program runs any more. */
    public void kill() throws InterruptedException {
        process.destroyForcibly().waitFor();
    }

    /** Runs a command of the program beside it, on the same home, and answers what it printed and its exit code. */
    public static String command(Path home, String... arguments) throws IOException, InterruptedException {
        ProcessBuilder builder = new ProcessBuilder(
                Path.of(System.getProperty("java.home"), "bin", "java").toString());
        builder.command()
                .addAll(List.of(
                        "-XX:TieredStopAtLevel=1",
                        "-cp",
                        System.getProperty("java.class.path"),
                        "org.levelgaze.Levelgaze"));
        builder.command().addAll(List.of(arguments));
        builder.environment().put("LEVELGAZE_HOME", home.toString());
        builder.environment().put("LC_ALL", "C");
        Process command = builder.redirectErrorStream(true).start();
        String printed = new String(command.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
        return printed + "exit " + command.waitFor();
    }

    /** What the program has printed. */
    public String log() throws IOException {
        return Files.readString(log);
    }

    /** Stops the program as a service manager would. */
    @Override
    public void close() {
        process.destroy();
        process.onExit().completeOnTimeout(process, 30, TimeUnit.SECONDS).join();
        process.destroyForcibly().onExit().join();
    }

    private static int freePort() throws IOException {
        try (ServerSocket socket = new ServerSocket(0)) {
            return socket.getLocalPort();
        }
    }
}
