package org.levelgaze.register;

import java.util.Locale;

/** How much a defect kind matters. */
public enum Severity {
    /** It can hurt someone or break a rule. */
    CRITICAL,
    /** The product may not do its job. */
    MAJOR,
    /** It is seen, and no more. */
    MINOR;

    /** The word for it in files, the API and the database. */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }

    /**
     * The severity with this word.
     *
     * @throws IllegalArgumentException when there is none
     */
    public static Severity ofWord(String word) {
        return valueOf(word.toUpperCase(Locale.ROOT));
    }
}
