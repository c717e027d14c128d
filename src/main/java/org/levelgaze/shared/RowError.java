package org.levelgaze.shared;

import java.util.List;

/**
 * One row of a file that cannot be taken, in parts, so that every language can word it.
 *
 * @param row the line of the file, its header being 1
 * @param column the column's name, empty when the whole row is meant
 * @param value what stands there, empty when nothing does
 * @param message the key of the sentence in the message bundles
 * @param arguments what the sentence names, in its order
 */
public record RowError(long row, String column, String value, String message, List<Object> arguments) {

    /** Keeps its own copy of the arguments. */
    public RowError {
        arguments = List.copyOf(arguments);
    }
}
