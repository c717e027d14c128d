package org.levelgaze.studies.reading;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;

/** Guesses the layout of a file from the names of its columns and the words in them. */
final class LayoutGuess {

    /** "Ana 2", "ana_t2", "Ana trial 2", "2": a name, perhaps a word for trial, a number. */
    private static final Pattern NAME_AND_TRIAL = Pattern.compile(
            "(?iu)^(.*?)[\\s_.#/-]*(?:trial|run|round|durchgang|lauf|(?<![\\p{L}\\p{N}])[tdr])?[\\s_.#/-]*(\\d{1,6})$");

    /** Longer names are taken whole; matching them would take long, too. */
    private static final int LONGEST_NAME = 60;

    private final List<Sketch.Column> columns;

    LayoutGuess(List<Sketch.Column> columns) {
        this.columns = columns;
    }

    /** The layout; {@code null} when the columns do not say enough. */
    @Nullable
    Layout layout() {
        String piece = named(KnownWords.PIECE);
        if (piece == null || hasTwins()) {
            return null;
        }
        String reference = named(KnownWords.REFERENCE);
        String defect = named(KnownWords.DEFECT);
        String appraiser = named(KnownWords.APPRAISER);
        String trial = named(KnownWords.TRIAL);
        String call = named(KnownWords.CALL);
        if (call != null) {
            boolean enough = appraiser != null;
            Integer only = trial == null ? 1 : null;
            List<Layout.CallColumn> calls = List.of(new Layout.CallColumn(call, null, only, named(KnownWords.SEEN)));
            return enough ? new Layout(piece, reference, defect, appraiser, trial, calls) : null;
        }
        List<Layout.CallColumn> calls = wide(appraiser != null, trial != null);
        return calls.isEmpty() ? null : new Layout(piece, reference, defect, appraiser, trial, calls);
    }

    /** Every column that is nothing else and holds words like those of calls; none when two of them would be the same. */
    private List<Layout.CallColumn> wide(boolean appraiserKnown, boolean trialKnown) {
        List<Layout.CallColumn> calls = new ArrayList<>();
        Set<List<Object>> sources = new HashSet<>();
        for (Sketch.Column column : columns) {
            if (hasRole(column) || !looksLikeCalls(column)) {
                continue;
            }
            Matcher parts = NAME_AND_TRIAL.matcher(column.name().strip());
            boolean numbered = column.name().length() <= LONGEST_NAME && parts.matches();
            String name = numbered ? parts.group(1).strip() : column.name().strip();
            int number = numbered ? Integer.parseInt(parts.group(2)) : 1;
            String appraiser = name.isEmpty() ? column.name().strip() : name;
            boolean fits = number >= 1 && !appraiser.isEmpty();
            if (!fits || !sources.add(List.of(appraiserKnown ? "" : appraiser, trialKnown ? 0 : number))) {
                return List.of();
            }
            calls.add(new Layout.CallColumn(
                    column.name(), appraiserKnown ? null : appraiser, trialKnown ? null : (Integer) number, null));
        }
        return calls;
    }

    /** All words known, or all of them 1 and 0, whose meaning is asked for. */
    private static boolean looksLikeCalls(Sketch.Column column) {
        List<String> words = column.words().stream().map(Words::plain).toList();
        boolean known =
                words.stream().allMatch(word -> KnownWords.ACCEPT.contains(word) || KnownWords.REJECT.contains(word));
        boolean digits = words.stream().allMatch(word -> word.equals("0") || word.equals("1"));
        return !words.isEmpty() && !column.more() && (known || digits);
    }

    private boolean hasRole(Sketch.Column column) {
        String name = Words.plain(column.name());
        return KnownWords.PIECE.contains(name)
                || KnownWords.REFERENCE.contains(name)
                || KnownWords.DEFECT.contains(name)
                || KnownWords.APPRAISER.contains(name)
                || KnownWords.TRIAL.contains(name)
                || KnownWords.SEEN.contains(name);
    }

    private boolean hasTwins() {
        Set<String> names = new HashSet<>();
        return columns.stream().anyMatch(column -> !names.add(Words.plain(column.name())));
    }

    /** The first column with one of these names. */
    private @Nullable String named(Set<String> names) {
        return columns.stream()
                .map(Sketch.Column::name)
                .filter(name -> names.contains(Words.plain(name)))
                .findFirst()
                .orElse(null);
    }
}
