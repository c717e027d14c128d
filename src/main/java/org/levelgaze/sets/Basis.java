package org.levelgaze.sets;

import java.util.Locale;

/** What the true states of an edition rest on. */
public enum Basis {
    /** Somebody entitled decided them. */
    DECISION,
    /** They came with a file of calls and nobody has adjudicated them. */
    IMPORT;

    /** The word for it in files, the API and the database. */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }

    static Basis ofWord(String word) {
        return valueOf(word.toUpperCase(Locale.ROOT));
    }
}
