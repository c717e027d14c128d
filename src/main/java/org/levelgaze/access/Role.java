package org.levelgaze.access;

import java.util.Locale;

/** What a person's account is for. One account may have several. */
public enum Role {
    /** Keeps accounts, tokens and settings. */
    ADMINISTRATOR,
    /** Imports studies and reads everything about them. */
    QUALITY_ENGINEER,
    /** May decide a piece's true state. */
    HOLDER_OF_THE_STANDARD,
    /** Runs a sitting; knows the piece, not its true state. */
    PROCTOR,
    /** Judges pieces in a sitting; never sees a true state. */
    APPRAISER,
    /** Reads everything, changes nothing. */
    AUDITOR;

    /** The role as the database and message keys write it: {@code quality-engineer}. */
    public String code() {
        return name().toLowerCase(Locale.ROOT).replace('_', '-');
    }

    /**
     * The role with this code.
     *
     * @throws IllegalArgumentException when there is none
     */
    public static Role of(String code) {
        return valueOf(code.toUpperCase(Locale.ROOT).replace('-', '_'));
    }

    /** The name of the right that Spring Security checks. */
    String authority() {
        return "ROLE_" + name();
    }
}
