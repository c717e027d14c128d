package org.levelgaze.studies.reading;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;

/**
 * What the columns and words of a file seem to mean. A guess is only ever shown to be confirmed; 1 and 0 are never guessed.
 *
 * @param layout which column is what; {@code null} when the columns do not say enough
 * @param words the words that could be told
 * @param openCalls words of the calls that must be asked for, in plain form
 * @param openTruths words of the true states that must be asked for, in plain form
 */
public record Guess(@Nullable Layout layout, Words words, List<String> openCalls, List<String> openTruths) {

    /** Keeps its own copies of the lists. */
    public Guess {
        openCalls = List.copyOf(openCalls);
        openTruths = List.copyOf(openTruths);
    }

    /** Whether nothing is left to ask for. */
    public boolean complete() {
        return layout != null && openCalls.isEmpty() && openTruths.isEmpty();
    }

    static Guess of(List<Sketch.Column> columns) {
        Layout layout = new LayoutGuess(columns).layout();
        Set<String> calls = new LinkedHashSet<>();
        Set<String> truths = new LinkedHashSet<>();
        if (layout != null) {
            for (Sketch.Column column : columns) {
                boolean isCall =
                        layout.calls().stream().anyMatch(call -> call.column().equals(column.name()));
                if (isCall) {
                    column.words().forEach(word -> calls.add(Words.plain(word)));
                }
                if (column.name().equals(layout.reference())) {
                    column.words().stream()
                            .filter(word -> !Words.isGrey(word))
                            .forEach(word -> truths.add(Words.plain(word)));
                }
            }
        }
        Words words = new Words(
                common(calls, KnownWords.ACCEPT),
                common(calls, KnownWords.REJECT),
                common(truths, KnownWords.ACCEPT),
                common(truths, KnownWords.REJECT));
        return new Guess(layout, words, open(calls), open(truths));
    }

    private static Set<String> common(Set<String> words, Set<String> known) {
        Set<String> common = new LinkedHashSet<>(words);
        common.retainAll(known);
        return common;
    }

    private static List<String> open(Set<String> words) {
        List<String> open = new ArrayList<>(words);
        open.removeIf(word -> KnownWords.ACCEPT.contains(word) || KnownWords.REJECT.contains(word));
        return open;
    }
}
