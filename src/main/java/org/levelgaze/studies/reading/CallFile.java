package org.levelgaze.studies.reading;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Iterator;
import java.util.List;
import java.util.concurrent.CancellationException;
import org.apache.commons.csv.CSVException;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;
import org.jspecify.annotations.Nullable;
import org.levelgaze.shared.Refusal;

/** An open file of delimited text: its header, then its rows, each with the line in which it begins. */
final class CallFile {

    /** Takes one row after the other. */
    @FunctionalInterface
    interface Rows {
        void take(CSVRecord cells, int row);
    }

    private static final int ROWS_BETWEEN_LOOKS = 2_000;

    private final FileBytes bytes;
    private final Utf8Text text;
    private final char delimiter;
    private final CSVParser parser;
    private final Iterator<CSVRecord> records;
    private final List<String> header;
    private int row = 1;
    private long rows;

    private CallFile(FileBytes bytes, FileHead head) throws IOException {
        this.bytes = bytes;
        text = new Utf8Text(head.rest(bytes));
        delimiter = head.delimiter();
        CSVFormat format = CSVFormat.RFC4180
                .builder()
                .setDelimiter(delimiter)
                .setIgnoreEmptyLines(false)
                .get();
        parser = CSVParser.builder().setReader(text).setFormat(format).get();
        records = parser.iterator();
        header = readHeader();
    }

    /**
     * Looks at the beginning of the file and reads its header.
     *
     * @throws Refusal when the file as a whole cannot be taken
     */
    static CallFile open(InputStream file) throws IOException {
        FileBytes bytes = new FileBytes(file, Limits.BYTES);
        return new CallFile(bytes, FileHead.of(bytes));
    }

    static Refusal refusal(String type, Object... arguments) {
        return new Refusal(Refusal.Kind.INVALID, type, arguments);
    }

    static void refuseAbove(long limit, long number, String type) {
        if (number > limit) {
            throw new Refusal(Refusal.Kind.TOO_LARGE, type, Long.toString(limit));
        }
    }

    char delimiter() {
        return delimiter;
    }

    /** The names of the columns. */
    List<String> header() {
        return header;
    }

    /** Reads to the end of the file; a row that breaks the quoting ends it, since what follows cannot be told apart. */
    void forEachRow(Watcher watcher, BadRows bad, Rows rowsTaker) {
        CSVRecord cells = next(bad);
        while (cells != null) {
            if (!isEmpty(cells)) {
                rows++;
                refuseAbove(Limits.ROWS, rows, "file-too-many-rows");
                rowsTaker.take(cells, row);
            }
            if (rows % ROWS_BETWEEN_LOOKS == 0 && !watcher.goesOn(rows, bytes.count())) {
                throw new CancellationException("stopped after " + rows + " rows");
            }
            cells = next(bad);
        }
        watcher.goesOn(rows, bytes.count());
    }

    FileFacts facts(long emptyCalls) {
        return new FileFacts(rows, emptyCalls, bytes.count(), bytes.sha256());
    }

    /** The next record; {@code null} at the end, or after a record that breaks the quoting. */
    @Nullable
    CSVRecord next(BadRows bad) {
        row = (int) parser.getCurrentLineNumber() + 1;
        text.beginRow();
        try {
            if (!records.hasNext()) {
                return null;
            }
            CSVRecord cells = records.next();
            refuseAbove(Limits.COLUMNS, cells.size(), "file-too-many-columns");
            return cells;
        } catch (UncheckedIOException e) {
            if (e.getCause() instanceof CSVException) {
                bad.add(row, "", "", "quotes");
                return null;
            }
            throw e;
        }
    }

    private List<String> readHeader() {
        BadRows bad = new BadRows(error -> {});
        CSVRecord cells = next(bad);
        if (bad.any()) {
            throw refusal("file-header-quotes");
        }
        if (cells == null || isEmpty(cells)) {
            throw refusal("file-header-empty");
        }
        return List.copyOf(cells.toList());
    }

    static boolean isEmpty(CSVRecord cells) {
        for (String cell : cells) {
            if (!cell.isBlank()) {
                return false;
            }
        }
        return true;
    }
}
