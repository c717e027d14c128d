package org.levelgaze.database;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.net.InetAddress;
import java.net.ServerSocket;
import java.nio.file.Path;
import java.time.Duration;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.StringJoiner;
import java.util.concurrent.CompletableFuture;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;

/** A running PostgreSQL: started on a free port of the loopback address, watched, and stopped. */
final class Server {

    private static final Logger LOG = LoggerFactory.getLogger(Server.class);
    private static final Duration PATIENCE = Duration.ofSeconds(30);
    private static final Duration PAUSE = Duration.ofMillis(200);

    /** Crash recovery after a long day may take minutes, and is no failure. */
    private static final String START_SECONDS = "600";

    private static final String STOP_SECONDS = "60";

    /** Stand first on the command line, where no settings file or {@code alter system} can undo them. */
    private static final Map<String, String> SETTINGS = Map.of(
            "listen_addresses", "127.0.0.1",
            "unix_socket_directories", "",
            "fsync", "on",
            "synchronous_commit", "on",
            "full_page_writes", "on");

    /** What a start says that can succeed a moment later: the one before it is still ending, or the port was taken. */
    private static final List<String> PASSING = List.of("postmaster.pid", "shared memory", "could not bind");

    private static final byte[] LOOPBACK = {127, 0, 0, 1};

    private final ServerCommands commands;
    private final ProcessHandle process;
    private final int port;
    private final CompletableFuture<Void> watch;
    private volatile boolean stopping;

    private Server(ServerCommands commands, ProcessHandle process, int port) {
        this.commands = commands;
        this.process = process;
        this.port = port;
        this.watch = process.onExit().thenRun(this::noticeEnd);
    }

    /** Starts it on the data folder, after stopping one that an earlier start left behind. */
    static Server start(ServerCommands commands, Map<String, String> settings) {
        long until = System.nanoTime() + PATIENCE.toNanos();
        while (true) {
            settle(commands);
            int port = freePort();
            String said = tryStart(commands, port, settings);
            if (said.isEmpty()) {
                return new Server(commands, process(commands), port);
            }
            if (System.nanoTime() > until || PASSING.stream().noneMatch(said::contains)) {
                throw new DatabaseRefusal(
                        "PostgreSQL does not start in " + commands.home().data() + ": " + reason(said),
                        "Its log is in " + commands.home().logs() + ".");
            }
            pause();
        }
    }

    /** The lines that say why, without the time before them; everything when there is none. */
    private static String reason(String said) {
        String fatal = said.lines()
                .filter(line -> line.contains("FATAL:") || line.contains("PANIC:"))
                .map(line -> line.replaceFirst(".*(FATAL|PANIC): +", ""))
                .collect(Collectors.joining("; "));
        return fatal.isEmpty() ? said : fatal + ".";
    }

    /** Empty when it runs, else what it said. */
    private static String tryStart(ServerCommands commands, int port, Map<String, String> settings) {
        Path data = commands.home().data();
        StringJoiner options = new StringJoiner(" ");
        options.add("-p " + port);
        Stream.of(SETTINGS, settings)
                .flatMap(map -> map.entrySet().stream())
                .forEach(setting -> options.add("-c " + setting.getKey() + "=" + setting.getValue()));
        ServerLog log = ServerLog.from(commands.home().logs());
        ServerCommands.Outcome outcome = commands.run(
                "pg_ctl",
                List.of(
                        "start",
                        "-w",
                        "-t",
                        START_SECONDS,
                        "-D",
                        data.toString(),
                        "-l",
                        commands.home().logs().resolve("start.log").toString(),
                        "-o",
                        options.toString()));
        return outcome.succeeded() ? "" : outcome.output() + "\n" + log.said();
    }

    /** Stops a PostgreSQL that serves our folder, and removes a pid file whose number means another process now. */
    private static void settle(ServerCommands commands) {
        Path data = commands.home().data();
        Optional<PidFile> left = PidFile.read(data);
        if (left.isEmpty()) {
            return;
        }
        switch (left.get().holder(data)) {
            case OURS -> {
                LOG.info(
                        "The PostgreSQL of an earlier start (process {}) still runs and is stopped first",
                        left.get().pid());
                stop(commands, "fast");
            }
            case FOREIGN -> PidFile.in(data).toFile().delete();
            case GONE, UNKNOWN -> {}
        }
    }

    private static ProcessHandle process(ServerCommands commands) {
        return PidFile.read(commands.home().data())
                .flatMap(file -> ProcessHandle.of(file.pid()))
                .orElseThrow(() -> new DatabaseRefusal(
                        "PostgreSQL ended right after its start in "
                                + commands.home().data() + ".",
                        "Its log is in " + commands.home().logs() + "."));
    }

    private static int freePort() {
        try (ServerSocket socket = new ServerSocket(0, 1, InetAddress.getByAddress(LOOPBACK))) {
            return socket.getLocalPort();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static void pause() {
        try {
            Thread.sleep(PAUSE.toMillis());
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new IllegalStateException("Interrupted while PostgreSQL was starting", e);
        }
    }

    private void noticeEnd() {
        if (!stopping) {
            LOG.error(
                    "PostgreSQL (process {}) has ended by itself: nothing can be stored or shown until the program is"
                            + " started again; its log is in {}",
                    process.pid(),
                    commands.home().logs());
        }
    }

    int port() {
        return port;
    }

    long pid() {
        return process.pid();
    }

    boolean alive() {
        return process.isAlive();
    }

    /** Ends it and waits; sessions still open are cut, which loses nothing that was acknowledged. */
    void stop() {
        stopping = true;
        watch.cancel(false);
        if (process.isAlive() && !stop(commands, "fast").succeeded() && process.isAlive()) {
            stop(commands, "immediate");
        }
    }

    private static ServerCommands.Outcome stop(ServerCommands commands, String mode) {
        String data = commands.home().data().toString();
        return commands.run("pg_ctl", List.of("stop", "-m", mode, "-w", "-t", STOP_SECONDS, "-D", data));
    }
}
