package org.levelgaze.studies.reading;

import java.util.HashMap;
import java.util.Map;
import java.util.Set;
import org.apache.commons.csv.CSVRecord;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.Call;
import org.levelgaze.agreement.Study;
import org.levelgaze.agreement.TrueState;
import org.levelgaze.studies.reading.Columns.Column;

/** Takes one row apart. What is wrong with it is named; what is right goes to the recorder. */
final class RowReader {

    /** Stands for a place or number that the row does not give as it should. */
    private static final int LOST = -2;

    private final Columns columns;
    private final Words words;
    private final Map<String, Call> calls = new HashMap<>();
    private final Map<String, TrueState> truths = new HashMap<>();
    private final Recorder recorder;
    private final BadRows bad;

    RowReader(Columns columns, Words words, Recorder recorder, BadRows bad) {
        this.columns = columns;
        this.words = words;
        this.recorder = recorder;
        this.bad = bad;
        words.accept().forEach(word -> calls.put(word, Call.ACCEPT));
        words.reject().forEach(word -> calls.put(word, Call.REJECT));
        words.good().forEach(word -> truths.put(word, TrueState.GOOD));
        words.defective().forEach(word -> truths.put(word, TrueState.DEFECTIVE));
    }

    void read(CSVRecord cells, int row) {
        if (cells.size() != columns.width()) {
            bad.add(row, "", "", "cells", Integer.toString(cells.size()), Integer.toString(columns.width()));
            return;
        }
        String label = name(cells, row, columns.piece());
        int piece = label == null ? LOST : recorder.piece(label, row);
        if (piece != LOST) {
            truth(cells, row, piece);
            defect(cells, row, piece);
        }
        int appraiser = appraiser(cells, row);
        int trial = columns.trial() == null ? LOST : trial(cells, row, columns.trial());
        for (Columns.Calls column : columns.calls()) {
            call(cells, row, piece, appraiser, trial, column);
        }
    }

    private void call(CSVRecord cells, int row, int piece, int rowAppraiser, int rowTrial, Columns.Calls column) {
        int appraiser = column.appraiser() == null ? rowAppraiser : recorder.appraiser(column.appraiser());
        int trial = column.trial() == 0 ? rowTrial : column.trial();
        String text = cells.get(column.call().at());
        boolean empty = text.isBlank();
        if (trial != LOST) {
            recorder.trial(trial, row, !empty);
        }
        if (empty) {
            recorder.countEmptyCall();
            return;
        }
        Call call = word(text, row, column.call(), calls, words.accept(), words.reject());
        int seen = column.seen() == null ? Study.NO_KIND : kind(cells, row, column.seen());
        if (call != null && piece != LOST && appraiser != LOST && trial != LOST && seen != LOST) {
            recorder.call(piece, appraiser, trial, call, seen, row, column.call());
        }
    }

    private void truth(CSVRecord cells, int row, int piece) {
        Column column = columns.reference();
        if (column == null || cells.get(column.at()).isBlank()) {
            return;
        }
        String text = cells.get(column.at());
        if (Words.isGrey(text)) {
            recorder.truth(piece, null, text, row, column);
            return;
        }
        TrueState truth = word(text, row, column, truths, words.good(), words.defective());
        if (truth == null) {
            recorder.truthUnclear(piece);
        } else {
            recorder.truth(piece, truth, text, row, column);
        }
    }

    private void defect(CSVRecord cells, int row, int piece) {
        int kind = columns.defect() == null ? Study.NO_KIND : kind(cells, row, columns.defect());
        if (columns.defect() != null && kind >= 0) {
            recorder.defect(piece, kind, row, columns.defect());
        }
    }

    private int appraiser(CSVRecord cells, int row) {
        String code = columns.appraiser() == null ? null : name(cells, row, columns.appraiser());
        return code == null ? LOST : recorder.appraiser(code);
    }

    /** A defect kind; none when the cell is empty. */
    private int kind(CSVRecord cells, int row, Column column) {
        String text = cells.get(column.at());
        if (text.isBlank()) {
            return Study.NO_KIND;
        }
        return sound(text, row, column) ? recorder.kind(text) : LOST;
    }

    private int trial(CSVRecord cells, int row, Column column) {
        String text = cells.get(column.at()).strip();
        boolean digits = !text.isEmpty() && text.length() <= 7 && text.chars().allMatch(c -> c >= '0' && c <= '9');
        int trial = digits ? Integer.parseInt(text) : 0;
        if (trial < 1 || trial > Limits.TRIAL) {
            bad.add(row, column.name(), text, "trial", column.name(), text, Integer.toString(Limits.TRIAL));
            return LOST;
        }
        return trial;
    }

    private <T> @Nullable T word(
            String text, int row, Column column, Map<String, T> meanings, Set<String> some, Set<String> others) {
        T meaning = meanings.get(Words.plain(text));
        if (meaning == null) {
            String one = String.join("/", some);
            bad.add(row, column.name(), text, "word", column.name(), text, one, String.join("/", others));
        }
        return meaning;
    }

    /** A label or a code, exactly as written; {@code null} when it cannot be taken. */
    private @Nullable String name(CSVRecord cells, int row, Column column) {
        String text = cells.get(column.at());
        if (text.isBlank()) {
            bad.add(row, column.name(), text, "empty", column.name());
            return null;
        }
        return sound(text, row, column) ? text : null;
    }

    private boolean sound(String text, int row, Column column) {
        if (text.length() > Limits.CELL) {
            bad.add(row, column.name(), text, "too-long", column.name(), text, Integer.toString(Limits.CELL));
            return false;
        }
        if (text.chars().anyMatch(Character::isISOControl)) {
            bad.add(row, column.name(), text, "control", column.name(), text);
            return false;
        }
        return true;
    }
}
