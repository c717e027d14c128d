package org.levelgaze.plot;

import java.util.Locale;
import java.util.regex.Pattern;

/**
 * How a picture is drawn.
 *
 * @param id stands before every id in the picture, so that many fit on one page: a letter, then letters, digits, dashes
 * @param interactive on a page: points can be reached by keyboard and say their numbers; else for paper: one image
 *     with an {@code alt}
 * @param locale how numbers are written
 * @param texts the words
 */
public record Drawing(String id, boolean interactive, Locale locale, Texts texts) {

    private static final Pattern ID = Pattern.compile("[A-Za-z][A-Za-z0-9-]*");

    /** Refuses an id that HTML or a style sheet could not take. */
    public Drawing {
        if (!ID.matcher(id).matches()) {
            throw new IllegalArgumentException("An id is a letter, then letters, digits and dashes, not " + id);
        }
    }

    /** The same with another id. */
    public Drawing named(String other) {
        return new Drawing(other, interactive, locale, texts);
    }

    String text(String key, Object... arguments) {
        return texts.of(key, arguments);
    }
}
