package org.levelgaze.studies.reading;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.Call;
import org.levelgaze.agreement.TrueState;
import org.levelgaze.studies.reading.Columns.Column;

/** Keeps what the rows say, and finds what only shows across rows. */
final class Recorder {

    /** What is known of a piece, and in which rows it was said. */
    private static final class KnownPiece {

        final int row;

        boolean truthSaid;

        @Nullable
        TrueState truth;

        String truthText = "";
        int truthRow;
        boolean truthUnclear;

        @Nullable
        String defect;

        int defectRow;

        KnownPiece(int row) {
            this.row = row;
        }
    }

    private final BadRows bad;
    private final Map<String, Integer> labels = new LinkedHashMap<>();
    private final List<KnownPiece> pieces = new ArrayList<>();
    private final Map<String, Integer> appraisers = new LinkedHashMap<>();
    private final Map<String, Integer> kinds = new LinkedHashMap<>();
    private final List<String> kindNames = new ArrayList<>();
    private final CallColumns calls = new CallColumns();
    private final CallPlaces places = new CallPlaces();
    private final TrialNumbers trials = new TrialNumbers();
    private long emptyCalls;

    Recorder(BadRows bad) {
        this.bad = bad;
    }

    /** The place of a piece, new or known. */
    int piece(String label, int row) {
        Integer known = labels.putIfAbsent(label, labels.size());
        if (known != null) {
            return known;
        }
        CallFile.refuseAbove(Limits.PIECES, labels.size(), "file-too-many-pieces");
        pieces.add(new KnownPiece(row));
        return pieces.size() - 1;
    }

    /** The place of an appraiser, new or known. */
    int appraiser(String code) {
        return place(code, appraisers, Limits.APPRAISERS, "file-too-many-appraisers");
    }

    /** The place of a defect kind, new or known. */
    int kind(String name) {
        int before = kinds.size();
        int place = place(name, kinds, Limits.KINDS, "file-too-many-kinds");
        if (kinds.size() > before) {
            kindNames.add(name);
        }
        return place;
    }

    private static int place(String name, Map<String, Integer> names, int limit, String refusal) {
        Integer known = names.putIfAbsent(name, names.size());
        if (known != null) {
            return known;
        }
        CallFile.refuseAbove(limit, names.size(), refusal);
        return names.size() - 1;
    }

    /** What a row says of a piece's true state; {@code null}: that it is undecided. */
    void truth(int place, @Nullable TrueState truth, String text, int row, Column column) {
        KnownPiece piece = pieces.get(place);
        if (!piece.truthSaid) {
            piece.truthSaid = true;
            piece.truth = truth;
            piece.truthText = text;
            piece.truthRow = row;
        } else if (piece.truth != truth) {
            said(row, column, text, "two-truths", place, piece.truthText, piece.truthRow);
        }
    }

    /** A row says something of this piece's true state that is no true state, and is named for it already. */
    void truthUnclear(int place) {
        pieces.get(place).truthUnclear = true;
    }

    void defect(int place, int kind, int row, Column column) {
        KnownPiece piece = pieces.get(place);
        String name = kindNames.get(kind);
        if (piece.defect == null) {
            piece.defect = name;
            piece.defectRow = row;
        } else if (!piece.defect.equals(name)) {
            said(row, column, name, "two-kinds", place, piece.defect, piece.defectRow);
        }
    }

    private void said(int row, Column column, String text, String message, int place, String before, int beforeRow) {
        bad.add(
                row,
                column.name(),
                text,
                message,
                column.name(),
                label(place, labels),
                text,
                before,
                Integer.toString(beforeRow));
    }

    void trial(int number, int row, boolean called) {
        trials.note(number, row, called);
    }

    void call(int piece, int appraiser, int trial, Call call, int seenKind, int row, Column column) {
        int before = places.note(piece, appraiser, trial, row);
        if (before == 0) {
            CallFile.refuseAbove(Limits.CALLS, calls.size() + 1, "file-too-many-calls");
            calls.add(piece, appraiser, trial, call, seenKind);
            return;
        }
        String label = label(piece, labels);
        String code = label(appraiser, appraisers);
        bad.add(row, column.name(), label, "twice", label, code, Integer.toString(trial), Integer.toString(before));
    }

    void countEmptyCall() {
        emptyCalls++;
    }

    long emptyCalls() {
        return emptyCalls;
    }

    boolean isEmpty() {
        return pieces.isEmpty();
    }

    /** Ends the recording: names gaps in the trial numbers, and pieces without a true state where others have one. */
    void close(Columns columns) {
        String trial = columns.trial() == null
                ? columns.calls().get(0).call().name()
                : columns.trial().name();
        trials.nameGaps(trial, bad);
        if (columns.reference() == null || pieces.stream().noneMatch(piece -> piece.truthSaid)) {
            return;
        }
        String reference = columns.reference().name();
        int place = 0;
        for (String label : labels.keySet()) {
            KnownPiece piece = pieces.get(place++);
            if (!piece.truthSaid && !piece.truthUnclear) {
                bad.add(piece.row, reference, "", "no-truth", reference, label);
            }
        }
    }

    RecordedCalls calls(FileFacts facts) {
        List<RecordedPiece> recorded = new ArrayList<>(pieces.size());
        int place = 0;
        for (String label : labels.keySet()) {
            KnownPiece piece = pieces.get(place++);
            recorded.add(new RecordedPiece(label, piece.truth, piece.truthSaid, piece.defect, piece.row));
        }
        return new RecordedCalls(recorded, List.copyOf(appraisers.keySet()), kindNames, calls, facts);
    }

    /** Looked for only when a row is bad. */
    private static String label(int place, Map<String, Integer> names) {
        return names.entrySet().stream()
                .filter(entry -> entry.getValue() == place)
                .map(Map.Entry::getKey)
                .findFirst()
                .orElseThrow();
    }
}
