package org.levelgaze.bench;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/** The jar as it is shipped, and the virtual machine that starts it. */
final class ProgramJar {

    private static final Path JAR = Path.of("target", "levelgaze.jar");

    private ProgramJar() {}

    /** Where it is; refuses when it was not built. */
    static Path path() {
        if (!Files.exists(JAR)) {
            throw new IllegalStateException(JAR + " is missing: run 'mvn package' first");
        }
        return JAR.toAbsolutePath();
    }

    /** A command for the virtual machine that runs the benchmark. */
    static ProcessBuilder java(String... arguments) {
        List<String> command = new ArrayList<>();
        command.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
        command.addAll(List.of(arguments));
        return new ProcessBuilder(command).redirectErrorStream(true).redirectOutput(ProcessBuilder.Redirect.DISCARD);
    }

    /** Runs a command to its end, which must be a good one. */
    static void runToEnd(ProcessBuilder command) throws IOException, InterruptedException {
        int code = command.start().waitFor();
        if (code != 0) {
            throw new IllegalStateException(command.command() + " ended with " + code);
        }
    }
}
