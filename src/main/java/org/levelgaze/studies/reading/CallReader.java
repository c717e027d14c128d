package org.levelgaze.studies.reading;

import java.io.IOException;
import java.io.InputStream;
import java.util.function.Consumer;
import org.levelgaze.shared.RowError;

/**
 * Reads a file of calls: UTF-8 with or without byte-order mark, RFC 4180, comma, semicolon or tab, any line ends. Takes
 * all of it or nothing, and names every bad row in one go. Reads once, row by row; only the calls are kept. Immutable and
 * safe for many threads.
 */
public final class CallReader {

    private final Layout layout;
    private final Words words;

    /** A reader of files of this layout with these words. */
    public CallReader(Layout layout, Words words) {
        this.layout = layout;
        this.words = words;
    }

    /** A reader of {@code piece,reference,appraiser,trial,call[,defect,seen]} with the plain words. */
    public static CallReader standard() {
        return new CallReader(Layout.standard(), Words.standard());
    }

    /** Reads a file. See {@link #read(InputStream, Watcher, Consumer)}. */
    public Reading read(InputStream file) throws IOException {
        return read(file, Watcher.NONE, error -> {});
    }

    /**
     * Reads a file to its end; the stream is not closed.
     *
     * @param file the bytes of the file
     * @param watcher told how far the reading is, and may stop it
     * @param badRows given every bad row as it is found, also those beyond the first that the answer lists
     * @return the calls, or the bad rows
     * @throws org.levelgaze.shared.Refusal when the file as a whole cannot be taken: empty, compressed, not UTF-8, too large
     * @throws java.util.concurrent.CancellationException when the watcher stops it
     * @throws IOException when the bytes cannot be read
     */
    public Reading read(InputStream file, Watcher watcher, Consumer<RowError> badRows) throws IOException {
        CallFile open = CallFile.open(file);
        BadRows bad = new BadRows(badRows);
        Columns columns = Columns.find(layout, open.header(), bad);
        if (bad.any()) {
            return bad.refused();
        }
        Recorder recorder = new Recorder(bad);
        RowReader rows = new RowReader(columns, words, recorder, bad);
        open.forEachRow(watcher, bad, rows::read);
        if (recorder.isEmpty() && !bad.any()) {
            throw CallFile.refusal("file-without-rows");
        }
        recorder.close(columns);
        return bad.any() ? bad.refused() : new Reading.Read(recorder.calls(open.facts(recorder.emptyCalls())));
    }
}
