package org.levelgaze.studies.importing;

import org.jspecify.annotations.Nullable;

/**
 * What somebody said about one word of a file, as typed.
 *
 * @param word the word, as the file writes it
 * @param meaning {@code accept} or {@code reject} for a call, {@code good} or {@code defective} for a true state; empty: not
 *     said
 */
record WordChoice(String word, String meaning) {

    /** Takes what a form leaves out as nothing said. */
    WordChoice(@Nullable String word, @Nullable String meaning) {
        this.word = Typed.text(word);
        this.meaning = Typed.text(meaning);
    }
}
