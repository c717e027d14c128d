package org.levelgaze.studies.importing;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.levelgaze.studies.reading.Layout;
import org.levelgaze.studies.reading.Limits;
import org.levelgaze.studies.reading.Sketch;
import org.springframework.validation.Errors;

/** What was said about the columns of a file, made into a layout; what does not fit is noted beside the column. */
final class LayoutAnswers {

    private final List<Sketch.Column> header;
    private final List<ColumnChoice> choices;
    private final Errors errors;

    LayoutAnswers(List<Sketch.Column> header, List<ColumnChoice> choices, Errors errors) {
        this.header = header;
        this.choices = choices;
        this.errors = errors;
    }

    /** The layout; none when something does not fit. */
    Optional<Layout> layout() {
        int before = errors.getErrorCount();
        String piece = only(ColumnRole.PIECE);
        String reference = only(ColumnRole.REFERENCE);
        String defect = only(ColumnRole.DEFECT);
        String appraiser = only(ColumnRole.APPRAISER);
        String trial = only(ColumnRole.TRIAL);
        if (piece == null) {
            errors.rejectValue("columns", "studies.import.fault.no-piece");
        }
        List<Layout.CallColumn> calls = calls(appraiser != null, trial != null);
        if (piece == null || errors.getErrorCount() > before) {
            return Optional.empty();
        }
        return Optional.of(new Layout(piece, reference, defect, appraiser, trial, calls));
    }

    /** The one column with this role; a second one is named. */
    private @Nullable String only(ColumnRole role) {
        List<Integer> found = with(role);
        found.stream().skip(1).forEach(at -> reject(at, "role", "role-twice", name(found.get(0))));
        return found.isEmpty() ? null : name(found.get(0));
    }

    private List<Layout.CallColumn> calls(boolean appraiserKnown, boolean trialKnown) {
        List<Integer> places = with(ColumnRole.CALL);
        if (places.isEmpty()) {
            errors.rejectValue("columns", "studies.import.fault.no-calls");
        }
        List<Layout.CallColumn> calls = new ArrayList<>();
        List<Source> sources = new ArrayList<>();
        for (int at : places) {
            Source source = source(at, appraiserKnown, trialKnown);
            int same = sources.indexOf(source);
            if (same >= 0 && source.isWhole()) {
                reject(at, "role", "same-calls", name(places.get(same)));
            }
            sources.add(source);
            if (source.isWhole()) {
                Integer trial = trialKnown ? null : (Integer) source.trial();
                String appraiser = appraiserKnown ? null : source.appraiser();
                calls.add(new Layout.CallColumn(name(at), appraiser, trial, seen(source, appraiserKnown, trialKnown)));
            }
        }
        return calls;
    }

    /** Whose calls a column holds, and in which trial; 0: not said. */
    private record Source(String appraiser, int trial) {

        boolean isWhole() {
            return !appraiser.isEmpty() && trial > 0;
        }
    }

    private Source source(int at, boolean appraiserKnown, boolean trialKnown) {
        ColumnChoice choice = choices.get(at);
        if (!appraiserKnown && choice.appraiser().isEmpty()) {
            reject(at, "appraiser", "whose", name(at));
        }
        int trial = trialKnown ? 1 : number(choice.trial());
        if (trial == 0) {
            reject(at, "trial", "which-trial", name(at), Integer.toString(Limits.TRIAL));
        }
        return new Source(appraiserKnown ? "*" : choice.appraiser(), trial);
    }

    /** The column of the kinds that were named with the calls of this source. */
    private @Nullable String seen(Source source, boolean appraiserKnown, boolean trialKnown) {
        for (int at : with(ColumnRole.SEEN)) {
            ColumnChoice choice = choices.get(at);
            boolean ofAppraiser = appraiserKnown || choice.appraiser().equals(source.appraiser());
            boolean ofTrial = trialKnown || number(choice.trial()) == source.trial();
            if (ofAppraiser && ofTrial) {
                return name(at);
            }
        }
        return null;
    }

    private List<Integer> with(ColumnRole role) {
        List<Integer> places = new ArrayList<>();
        for (int at = 0; at < choices.size(); at++) {
            if (choices.get(at).is(role)) {
                places.add(at);
            }
        }
        return places;
    }

    private String name(int at) {
        return header.get(at).name();
    }

    private void reject(int at, String field, String fault, Object... arguments) {
        errors.rejectValue("columns[" + at + "]." + field, "studies.import.fault." + fault, arguments, null);
    }

    private static int number(String typed) {
        boolean digits =
                !typed.isEmpty() && typed.length() <= 7 && typed.chars().allMatch(c -> c >= '0' && c <= '9');
        int number = digits ? Integer.parseInt(typed) : 0;
        return number <= Limits.TRIAL ? number : 0;
    }
}
