package org.levelgaze.cli;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;

/**
 * What {@code assess} is asked.
 *
 * @param file path of the file, {@code -} for the standard input
 * @param json whether the answer is JSON, else text
 * @param confidence level of the intervals
 */
record AssessOptions(String file, boolean json, double confidence) {

    /** Part of the command line is not understood. */
    static final class NotUnderstood extends Exception {

        private static final long serialVersionUID = 1L;

        private final String key;
        private final String argument;

        NotUnderstood(String key, String argument) {
            super(key + " " + argument);
            this.key = key;
            this.argument = argument;
        }

        String key() {
            return key;
        }

        String argument() {
            return argument;
        }
    }

    /** Options and one file, in any order; {@code --option value} and {@code --option=value} mean the same. */
    static AssessOptions of(List<String> arguments) throws NotUnderstood {
        Deque<String> open = new ArrayDeque<>(arguments);
        List<String> files = new ArrayList<>();
        boolean json = false;
        double confidence = 0.95;
        while (!open.isEmpty()) {
            String argument = open.removeFirst();
            int equals = argument.startsWith("--") ? argument.indexOf('=') : -1;
            if (equals > 0) {
                open.addFirst(argument.substring(equals + 1));
                argument = argument.substring(0, equals);
            }
            switch (argument) {
                case "--format" -> json = isJson(value(argument, open));
                case "--confidence" -> confidence = level(value(argument, open));
                default -> files.add(file(argument));
            }
        }
        if (files.size() != 1) {
            throw new NotUnderstood("cli.assess.one-file", Integer.toString(files.size()));
        }
        return new AssessOptions(files.get(0), json, confidence);
    }

    private static String file(String argument) throws NotUnderstood {
        if (argument.startsWith("-") && !argument.equals("-")) {
            throw new NotUnderstood("cli.assess.unknown-option", argument);
        }
        return argument;
    }

    private static String value(String option, Deque<String> open) throws NotUnderstood {
        if (open.isEmpty()) {
            throw new NotUnderstood("cli.assess.no-value", option);
        }
        return open.removeFirst();
    }

    private static boolean isJson(String format) throws NotUnderstood {
        if (!format.equals("json") && !format.equals("text")) {
            throw new NotUnderstood("cli.assess.unknown-format", format);
        }
        return format.equals("json");
    }

    private static double level(String text) throws NotUnderstood {
        double level;
        try {
            level = Double.parseDouble(text);
        } catch (NumberFormatException e) {
            level = Double.NaN;
        }
        if (!(level > 0 && level < 1)) {
            throw new NotUnderstood("cli.assess.no-level", text);
        }
        return level;
    }
}
