package org.levelgaze.shared;

import java.util.function.Function;
import org.jspecify.annotations.Nullable;

/** Reads a word that must be one of a few. */
public final class Words {

    private Words() {}

    /**
     * The value behind a word.
     *
     * @param field the field it stands in, for the refusal
     * @param word what was written; null counts as nothing written
     * @param reader gives the value or throws {@link IllegalArgumentException}
     * @param expected the words that are understood, for the refusal
     * @throws Refusal when the word is none of them
     */
    public static <T> T read(String field, @Nullable String word, Function<String, T> reader, String expected) {
        try {
            return reader.apply(word == null ? "" : word);
        } catch (IllegalArgumentException e) {
            throw new Refusal(Refusal.Kind.INVALID, "word-not-known", field, word == null ? "" : word, expected);
        }
    }
}
