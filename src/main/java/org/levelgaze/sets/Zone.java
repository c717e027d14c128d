package org.levelgaze.sets;

import java.util.Locale;

/** How easy a piece is to call. */
public enum Zone {
    /** Anybody trained calls it good. */
    CLEAR_GOOD,
    /** It sits at the limit of acceptance. */
    BORDERLINE,
    /** Anybody trained calls it defective. */
    CLEAR_DEFECTIVE;

    /** The words for it in files, the API and the database. */
    public String words() {
        return name().toLowerCase(Locale.ROOT).replace('_', ' ');
    }

    /**
     * The zone with these words.
     *
     * @throws IllegalArgumentException when there is none
     */
    public static Zone ofWords(String words) {
        return valueOf(words.toUpperCase(Locale.ROOT).replace(' ', '_'));
    }
}
