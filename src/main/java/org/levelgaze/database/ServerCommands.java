package org.levelgaze.database;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/**
 * Runs PostgreSQL's own commands.
 *
 * @param programs the folder that holds {@code bin}
 * @param user as whom
 * @param home where they work; their output passes through a file in its log folder
 */
record ServerCommands(Path programs, ServerUser user, Home home) {

    /**
     * How a command ended.
     *
     * @param succeeded whether it answered 0
     * @param output what it said
     */
    record Outcome(boolean succeeded, String output) {}

    /** Runs one and waits for its end; each of them has a time limit of its own or ends by itself. */
    Outcome run(String program, List<String> arguments) {
        List<String> command = new ArrayList<>();
        command.add(programs.resolve("bin").resolve(program).toString());
        command.addAll(arguments);
        Path output = home.logs().resolve(program + ".out");
        ProcessBuilder builder = new ProcessBuilder(user.wrap(command))
                .directory(home.folder().toFile())
                .redirectErrorStream(true)
                .redirectOutput(output.toFile());
        builder.environment().keySet().removeIf(name -> name.startsWith("PG"));
        builder.environment().put("LC_ALL", "C");
        try {
            int status = builder.start().waitFor();
            return new Outcome(
                    status == 0,
                    Files.readString(output, StandardCharsets.UTF_8).strip());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new IllegalStateException("Interrupted while waiting for " + program, e);
        }
    }
}
