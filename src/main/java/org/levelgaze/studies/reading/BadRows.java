package org.levelgaze.studies.reading;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.function.Consumer;
import org.levelgaze.shared.RowError;

/** Gathers bad rows: keeps the first, counts all, hands each on. */
final class BadRows {

    static final int KEPT = 200;
    private static final int SHOWN = 80;

    private final Consumer<RowError> sink;
    private final List<RowError> first = new ArrayList<>();
    private long count;

    BadRows(Consumer<RowError> sink) {
        this.sink = sink;
    }

    /**
     * Adds one.
     *
     * @param message the last part of the key of its sentence
     * @param arguments what the sentence names, in its order; texts are shortened and their control characters shown
     */
    void add(long row, String column, String value, String message, String... arguments) {
        List<Object> shown = new ArrayList<>();
        for (String argument : arguments) {
            shown.add(shown(argument));
        }
        RowError error = new RowError(row, column, shown(value), "studies.row." + message, shown);
        if (first.size() < KEPT) {
            first.add(error);
        }
        count++;
        sink.accept(error);
    }

    boolean any() {
        return count > 0;
    }

    Reading.Refused refused() {
        first.sort(Comparator.comparingLong(RowError::row));
        return new Reading.Refused(first, count);
    }

    private static String shown(String text) {
        String visible = text.codePoints()
                .limit(SHOWN)
                .collect(
                        StringBuilder::new,
                        (into, point) -> {
                            if (Character.isISOControl(point)) {
                                into.append(String.format("\\u%04X", point));
                            } else {
                                into.appendCodePoint(point);
                            }
                        },
                        StringBuilder::append)
                .toString();
        return text.codePointCount(0, text.length()) > SHOWN ? visible + "…" : visible;
    }
}
