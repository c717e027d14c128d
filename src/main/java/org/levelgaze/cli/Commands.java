package org.levelgaze.cli;

import java.io.FileDescriptor;
import java.io.FileInputStream;
import java.io.FileOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.OptionalInt;

/** The commands of the program, known by its first argument. They are looked for before the web application starts. */
public final class Commands {

    /** All went well. */
    static final int DONE = 0;
    /** What is stored does not hold. */
    static final int BROKEN = 1;
    /** The input or the command line cannot be taken. */
    static final int REFUSED = 2;

    private Commands() {}

    /**
     * Runs the command that the first argument names, on the standard streams, in UTF-8.
     *
     * @return the exit code; empty when the arguments are those of the web application
     */
    public static OptionalInt run(String... arguments) {
        Console console = new Console(
                new FileInputStream(FileDescriptor.in),
                new PrintStream(new FileOutputStream(FileDescriptor.out), false, StandardCharsets.UTF_8),
                new PrintStream(new FileOutputStream(FileDescriptor.err), true, StandardCharsets.UTF_8),
                Locale.getDefault());
        OptionalInt code = run(console, arguments);
        console.out().flush();
        return code;
    }

    static OptionalInt run(Console console, String... arguments) {
        if (arguments.length == 0) {
            return OptionalInt.empty();
        }
        List<String> rest = Arrays.asList(arguments).subList(1, arguments.length);
        return switch (arguments[0]) {
            case "assess" -> OptionalInt.of(new AssessCommand(console).run(rest));
            case "verify" -> OptionalInt.of(new VerifyCommand(console).run(rest));
            case "help", "--help" -> OptionalInt.of(help(console));
            default ->
                arguments[0].startsWith("-") ? OptionalInt.empty() : OptionalInt.of(unknown(console, arguments[0]));
        };
    }

    private static int help(Console console) {
        console.out().println(console.text("cli.usage"));
        return DONE;
    }

    private static int unknown(Console console, String command) {
        console.err().println(console.text("cli.unknown-command", command));
        console.err().println(console.text("cli.usage"));
        return REFUSED;
    }
}
