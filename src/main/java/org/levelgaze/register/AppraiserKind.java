package org.levelgaze.register;

import java.util.Locale;

/** Whether a person or a camera judges. */
public enum AppraiserKind {
    /** Somebody with eyes. */
    PERSON,
    /** A camera with its configurations. */
    CAMERA;

    /** The word for it in files, the API and the database. */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }

    /**
     * The kind with this word.
     *
     * @throws IllegalArgumentException when there is none
     */
    public static AppraiserKind ofWord(String word) {
        return valueOf(word.toUpperCase(Locale.ROOT));
    }
}
