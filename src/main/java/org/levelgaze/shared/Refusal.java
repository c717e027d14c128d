package org.levelgaze.shared;

import java.util.List;

/**
 * Says no to a request that was understood: nothing was changed. The sentence comes from the message bundles and names
 * the thing, the place and the way out. Pages show it where the user stands; the API answers it as problem details
 * (RFC 9457) whose type ends in {@link #type()}.
 */
public class Refusal extends RuntimeException {

    private static final long serialVersionUID = 1L;

    /** Why, as far as a program must know. */
    public enum Kind {
        /** The request cannot be read. */
        MALFORMED,
        /** Whoever asks may not do this. */
        FORBIDDEN,
        /** There is no such thing. */
        NOT_FOUND,
        /** It clashes with what is stored. */
        CONFLICT,
        /** It can be read but breaks a rule. */
        INVALID,
        /** It is larger than what is taken. */
        TOO_LARGE,
        /** Too many tries in too short a time. */
        TOO_MANY
    }

    private final Kind kind;
    private final String type;
    private final transient List<Object> arguments;
    private final transient List<RowError> rows;
    private final long rowsInAll;

    /**
     * A refusal without rows.
     *
     * @param kind why
     * @param type a stable name such as {@code duplicate-study}; the sentence has the key {@code refusal.} + type
     * @param arguments what the sentence names, in its order
     */
    public Refusal(Kind kind, String type, Object... arguments) {
        this(kind, type, List.of(arguments), List.of(), 0);
    }

    /**
     * A refusal of a file.
     *
     * @param kind why
     * @param type a stable name; the sentence has the key {@code refusal.} + type
     * @param arguments what the sentence names, in its order
     * @param rows the first bad rows
     * @param rowsInAll how many bad rows there are in all
     */
    public Refusal(Kind kind, String type, List<Object> arguments, List<RowError> rows, long rowsInAll) {
        super(type + " " + arguments);
        this.kind = kind;
        this.type = type;
        this.arguments = List.copyOf(arguments);
        this.rows = List.copyOf(rows);
        this.rowsInAll = rowsInAll;
    }

    /** Why, as far as a program must know. */
    public Kind kind() {
        return kind;
    }

    /** The stable name of this refusal. */
    public String type() {
        return type;
    }

    /** The key of the sentence in the message bundles. */
    public String messageKey() {
        return "refusal." + type;
    }

    /** What the sentence names, in its order. */
    public List<Object> arguments() {
        return arguments;
    }

    /** The first bad rows, none when no file is meant. */
    public List<RowError> rows() {
        return rows;
    }

    /** How many bad rows there are in all. */
    public long rowsInAll() {
        return rowsInAll;
    }
}
