package org.levelgaze.studies.reading;

import java.io.IOException;
import java.io.InputStream;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import org.apache.commons.csv.CSVRecord;

/**
 * What the beginning of a file looks like, for the page on which the user says which column is what.
 *
 * @param delimiter comma, semicolon or tab
 * @param columns the columns
 * @param firstRows the first rows, cell by cell; long cells are shortened
 * @param guess what the columns and words seem to mean
 */
public record Sketch(char delimiter, List<Column> columns, List<List<String>> firstRows, Guess guess) {

    /** Rows that are looked at. */
    public static final int ROWS = 5_000;

    /** Rows that are shown. */
    public static final int SHOWN_ROWS = 8;

    /** Different words of a column that are shown. */
    public static final int SHOWN_WORDS = 12;

    private static final int SHOWN_CHARACTERS = 80;

    /**
     * A column.
     *
     * @param name its name in the header, exactly as written
     * @param words the different words in it, in the order of first appearance; the first of them when there are many
     * @param more whether there are more words
     */
    public record Column(String name, List<String> words, boolean more) {

        /** Keeps its own copy of the list. */
        public Column {
            words = List.copyOf(words);
        }
    }

    /** Keeps its own copies of the lists. */
    public Sketch {
        columns = List.copyOf(columns);
        firstRows = firstRows.stream().map(List::copyOf).toList();
    }

    /**
     * Looks at the beginning of a file; the stream is not closed and not read to its end.
     *
     * @throws org.levelgaze.shared.Refusal when the file as a whole cannot be taken
     * @throws IOException when the bytes cannot be read
     */
    public static Sketch of(InputStream file) throws IOException {
        CallFile open = CallFile.open(file);
        List<Set<String>> words = new ArrayList<>();
        open.header().forEach(name -> words.add(new LinkedHashSet<>()));
        List<List<String>> rows = new ArrayList<>();
        BadRows unread = new BadRows(error -> {});
        CSVRecord cells = open.next(unread);
        for (int row = 0; cells != null && row < ROWS; row++) {
            if (rows.size() < SHOWN_ROWS && !CallFile.isEmpty(cells)) {
                rows.add(cells.toList().stream().map(Sketch::shown).toList());
            }
            gather(cells, words);
            cells = open.next(unread);
        }
        List<Column> columns = new ArrayList<>();
        for (int at = 0; at < words.size(); at++) {
            List<String> found = List.copyOf(words.get(at));
            boolean more = found.size() > SHOWN_WORDS;
            columns.add(new Column(open.header().get(at), more ? found.subList(0, SHOWN_WORDS) : found, more));
        }
        return new Sketch(open.delimiter(), columns, rows, Guess.of(columns));
    }

    private static void gather(CSVRecord cells, List<Set<String>> words) {
        for (int at = 0; at < Math.min(cells.size(), words.size()); at++) {
            String cell = cells.get(at);
            if (!cell.isBlank() && words.get(at).size() <= SHOWN_WORDS) {
                words.get(at).add(shown(cell.strip()));
            }
        }
    }

    private static String shown(String cell) {
        return cell.codePointCount(0, cell.length()) <= SHOWN_CHARACTERS
                ? cell
                : cell.substring(0, cell.offsetByCodePoints(0, SHOWN_CHARACTERS)) + "…";
    }
}
