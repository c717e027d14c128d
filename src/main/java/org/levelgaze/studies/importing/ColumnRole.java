package org.levelgaze.studies.importing;

import java.util.Arrays;
import java.util.Locale;
import java.util.Optional;

/** What a column of a file can be. */
enum ColumnRole {
    PIECE,
    REFERENCE,
    DEFECT,
    APPRAISER,
    TRIAL,
    CALL,
    SEEN;

    /** The word for it in forms and in the keys of its texts; called by templates. */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }

    static Optional<ColumnRole> ofWord(String word) {
        return Arrays.stream(values()).filter(role -> role.word().equals(word)).findFirst();
    }
}
