package org.levelgaze.studies.importing;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.levelgaze.studies.reading.Layout;
import org.levelgaze.studies.reading.Sketch;
import org.levelgaze.studies.reading.Words;

/** Answers that a form shows before anybody has typed: from a guess, or from what is remembered for the task. */
final class Answers {

    /** Words of a column that are asked for; a column with more of them hardly holds calls or true states. */
    static final int WORDS_ASKED = 30;

    static final String ACCEPT = "accept";
    static final String REJECT = "reject";
    static final String GOOD = "good";
    static final String DEFECTIVE = "defective";

    private Answers() {}

    /** A layout as choices for the columns of a file. */
    static List<ColumnChoice> columns(@Nullable Layout layout, List<Sketch.Column> header) {
        return header.stream().map(column -> choice(layout, column.name())).toList();
    }

    private static ColumnChoice choice(@Nullable Layout layout, String column) {
        if (layout == null) {
            return ColumnChoice.LEFT_OUT;
        }
        Map<ColumnRole, @Nullable String> alone = new HashMap<>();
        alone.put(ColumnRole.PIECE, layout.piece());
        alone.put(ColumnRole.REFERENCE, layout.reference());
        alone.put(ColumnRole.DEFECT, layout.defect());
        alone.put(ColumnRole.APPRAISER, layout.appraiser());
        alone.put(ColumnRole.TRIAL, layout.trial());
        for (Map.Entry<ColumnRole, @Nullable String> one : alone.entrySet()) {
            if (same(one.getValue(), column)) {
                return ColumnChoice.of(one.getKey());
            }
        }
        for (Layout.CallColumn call : layout.calls()) {
            if (same(call.column(), column)) {
                return choice(ColumnRole.CALL, call);
            }
            if (same(call.seen(), column)) {
                return choice(ColumnRole.SEEN, call);
            }
        }
        return ColumnChoice.LEFT_OUT;
    }

    private static ColumnChoice choice(ColumnRole role, Layout.CallColumn call) {
        String trial = call.trial() == null ? "" : Integer.toString(call.trial());
        return new ColumnChoice(role.word(), call.appraiser(), trial);
    }

    private static boolean same(@Nullable String one, String other) {
        return one != null && Words.plain(one).equals(Words.plain(other));
    }

    /** Whether a file with this header can be what a layout says: it has its columns, and no others that look like calls. */
    static boolean fits(Layout layout, Sketch sketch) {
        List<ColumnChoice> choices = columns(layout, sketch.columns());
        long found = choices.stream().filter(choice -> !choice.role().isEmpty()).count();
        Layout guessed = sketch.guess().layout();
        boolean sameCalls = guessed == null
                || layout.appraiser() != null
                || guessed.calls().size() == layout.calls().size();
        return found == columnsOf(layout) && sameCalls;
    }

    private static long columnsOf(Layout layout) {
        List<@Nullable String> named = new ArrayList<>();
        named.add(layout.piece());
        named.add(layout.reference());
        named.add(layout.defect());
        named.add(layout.appraiser());
        named.add(layout.trial());
        layout.calls().forEach(call -> {
            named.add(call.column());
            named.add(call.seen());
        });
        return named.stream().filter(name -> name != null).count();
    }

    /** The words of the columns with this role, and further ones, each with what was said about it. */
    static List<WordChoice> words(
            List<Sketch.Column> header,
            List<ColumnChoice> choices,
            ColumnRole role,
            List<String> further,
            Map<String, String> meanings) {
        Map<String, WordChoice> words = new LinkedHashMap<>();
        for (int at = 0; at < header.size(); at++) {
            if (choices.get(at).is(role)) {
                header.get(at).words().stream()
                        .filter(word -> role != ColumnRole.REFERENCE || !Words.isGrey(word))
                        .forEach(word -> ask(word, words, meanings));
            }
        }
        further.forEach(word -> ask(word, words, meanings));
        return List.copyOf(words.values());
    }

    private static void ask(String word, Map<String, WordChoice> words, Map<String, String> meanings) {
        String plain = Words.plain(word);
        if (!plain.isEmpty() && words.size() < WORDS_ASKED) {
            words.putIfAbsent(plain, new WordChoice(word, meanings.getOrDefault(plain, "")));
        }
    }

    /** What words of calls mean, by their plain form. */
    static Map<String, String> ofCalls(Words words) {
        return meanings(words.accept(), ACCEPT, words.reject(), REJECT);
    }

    /** What words of true states mean, by their plain form. */
    static Map<String, String> ofTruths(Words words) {
        return meanings(words.good(), GOOD, words.defective(), DEFECTIVE);
    }

    /** What was said about words, by their plain form. */
    static Map<String, String> said(List<WordChoice> choices) {
        Map<String, String> said = new HashMap<>();
        choices.stream()
                .filter(choice -> !choice.meaning().isEmpty())
                .forEach(choice -> said.put(Words.plain(choice.word()), choice.meaning()));
        return said;
    }

    private static Map<String, String> meanings(Set<String> some, String one, Set<String> others, String other) {
        Map<String, String> meanings = new HashMap<>();
        some.forEach(word -> meanings.put(word, one));
        others.forEach(word -> meanings.put(word, other));
        return meanings;
    }
}
