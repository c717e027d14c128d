package org.levelgaze.bench;

import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Objects;

/**
 * {@code java -jar levelgaze.jar assess} on a file of 450 calls as a process, against {@code java -version} as a process.
 *
 * <p>Arguments: rounds (15). Two more rounds warm up the machine's file cache.
 */
final class AssessAgainstJava {

    private static final int WARM_UP = 2;

    private AssessAgainstJava() {}

    /** Runs the benchmark. */
    public static void main(String[] arguments) throws Exception {
        int rounds = arguments.length > 0 ? Integer.parseInt(arguments[0]) : 15;
        Path file = Files.createTempFile("levelgaze-bench", ".csv");
        try (InputStream calls =
                Objects.requireNonNull(AssessAgainstJava.class.getResourceAsStream("/reference/aiag_msa4_calls.csv"))) {
            Files.write(file, calls.readAllBytes());
            run(rounds, ProgramJar.path().toString(), file.toString());
        } finally {
            Files.delete(file);
        }
    }

    private static void run(int rounds, String jar, String file) throws Exception {
        Measured measured = new Measured();
        for (int round = -WARM_UP; round < rounds; round++) {
            if (round == 0) {
                measured.forget();
            }
            measured.time("java -version", 1, () -> ProgramJar.runToEnd(ProgramJar.java("-version")));
            measured.time("assess, text", 1, () -> ProgramJar.runToEnd(ProgramJar.java("-jar", jar, "assess", file)));
            measured.time(
                    "assess, JSON",
                    1,
                    () -> ProgramJar.runToEnd(ProgramJar.java("-jar", jar, "assess", file, "--format", "json")));
        }
        System.out.println("A file of 450 calls assessed by a process");
        measured.print();
    }
}
