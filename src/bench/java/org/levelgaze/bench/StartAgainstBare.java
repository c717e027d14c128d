package org.levelgaze.bench;

import java.io.IOException;
import java.net.HttpURLConnection;
import java.net.ServerSocket;
import java.net.URI;
import java.nio.file.Files;
import java.nio.file.Path;

/**
 * The start of the jar, on a home that was prepared by a start before, to the first 200 of its health and of its first page;
 * against the start of a bare Spring Boot application in a jar of the same make, see {@link BareJar}.
 *
 * <p>Arguments: rounds (7). One more round prepares the home and the machine's file cache.
 */
final class StartAgainstBare {

    private static final int BETWEEN_LOOKS = 10;
    private static final String BARE = "bare application, first page";

    private final Path folder;
    private final Measured measured = new Measured();

    private StartAgainstBare(Path folder) {
        this.folder = folder;
    }

    /** Runs the benchmark. */
    public static void main(String[] arguments) throws Exception {
        int rounds = arguments.length > 0 ? Integer.parseInt(arguments[0]) : 7;
        StartAgainstBare bench = new StartAgainstBare(Files.createTempDirectory("levelgaze-bench"));
        Path bare = bench.folder.resolve("bare.jar");
        BareJar.write(ProgramJar.path(), bare);
        for (int round = -1; round < rounds; round++) {
            if (round == 0) {
                bench.measured.forget();
            }
            bench.start(bare, new String[][] {{BARE, "/"}});
            bench.start(ProgramJar.path(), new String[][] {
                {"levelgaze.jar, health", "/actuator/health"}, {"levelgaze.jar, first page", "/setup"}
            });
        }
        System.out.println("From the start of the process to the first answer 200");
        bench.measured.print();
    }

    /** Starts a jar, asks for one address after the other until each answers, and stops it again. */
    private void start(Path jar, String[][] wanted) throws Exception {
        int port = freePort();
        ProcessBuilder command = ProgramJar.java("-jar", jar.toString());
        command.environment().put("SERVER_PORT", Integer.toString(port));
        command.environment().put("LEVELGAZE_HOME", folder.resolve("home").toString());
        long start = System.nanoTime();
        Process process = command.start();
        try {
            for (String[] one : wanted) {
                awaitAnswer(process, "http://localhost:" + port + one[1]);
                measured.add(one[0], (System.nanoTime() - start) / 1e9);
            }
        } finally {
            process.destroy();
            process.waitFor();
        }
    }

    private static void awaitAnswer(Process process, String address) throws InterruptedException {
        while (!answers(address)) {
            if (!process.isAlive()) {
                throw new IllegalStateException("The program ended with " + process.exitValue() + ", for " + address);
            }
            Thread.sleep(BETWEEN_LOOKS);
        }
    }

    private static boolean answers(String address) {
        try {
            HttpURLConnection connection =
                    (HttpURLConnection) URI.create(address).toURL().openConnection();
            return connection.getResponseCode() == HttpURLConnection.HTTP_OK;
        } catch (IOException notYet) {
            return false;
        }
    }

    private static int freePort() throws IOException {
        try (ServerSocket socket = new ServerSocket(0)) {
            return socket.getLocalPort();
        }
    }
}
