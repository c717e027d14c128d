package org.levelgaze.sets;

import java.util.Locale;

/** What those who hold the standard have decided of a piece. */
public enum TrueState {
    /** It meets the standard. */
    GOOD,
    /** It does not. */
    DEFECTIVE,
    /** Undecided: never scored. */
    GREY;

    /** The word for it in files, the API and the database. */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }

    /**
     * The state with this word.
     *
     * @throws IllegalArgumentException when there is none
     */
    public static TrueState ofWord(String word) {
        return valueOf(word.toUpperCase(Locale.ROOT));
    }
}
