package org.levelgaze.agreement;

import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Set;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;

/** The files of published values. */
final class Reference {

    /** One row, by column name. */
    record Row(Map<String, String> cells) {

        String get(String column) {
            return Objects.requireNonNull(cells.get(column), column);
        }
    }

    private Reference() {}

    /** The rows of a file, each by column name. */
    static List<Row> rows(String file) {
        CSVFormat format = CSVFormat.RFC4180
                .builder()
                .setHeader()
                .setSkipHeaderRecord(true)
                .get();
        try (InputStream in = Objects.requireNonNull(Reference.class.getResourceAsStream("/reference/" + file), file);
                CSVParser parser = CSVParser.parse(new InputStreamReader(in, StandardCharsets.UTF_8), format)) {
            return parser.stream().map(CSVRecord::toMap).map(Row::new).toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** The square table of two judges, categories in the order of first appearance. */
    static long[][] table(List<Row> rows, String first, String second) {
        Set<String> names = new LinkedHashSet<>();
        rows.forEach(row -> names.add(row.get(first)));
        List<String> categories = List.copyOf(names);
        long[][] table = new long[categories.size()][categories.size()];
        for (Row row : rows) {
            table[categories.indexOf(row.get(first))][categories.indexOf(row.get(second))] =
                    Long.parseLong(row.get("count"));
        }
        return table;
    }

    /** Counts of values per unit, from one row per unit and one column per coder; the first column names the unit. */
    static List<int[]> unitCounts(String file) {
        List<List<String>> units = new ArrayList<>();
        Set<String> names = new LinkedHashSet<>();
        for (Row row : rows(file)) {
            List<String> values = row.cells().values().stream()
                    .skip(1)
                    .filter(value -> !value.isEmpty())
                    .toList();
            units.add(values);
            names.addAll(values);
        }
        List<String> categories = List.copyOf(names);
        return units.stream().map(values -> counts(values, categories)).toList();
    }

    private static int[] counts(List<String> values, List<String> categories) {
        int[] counts = new int[categories.size()];
        values.forEach(value -> counts[categories.indexOf(value)]++);
        return counts;
    }

    /** Counts of categories per unit, from columns that hold the counts. */
    static List<int[]> countedUnits(String file, int categories) {
        return rows(file).stream()
                .map(row -> row.cells().values().stream()
                        .skip(1)
                        .limit(categories)
                        .mapToInt(Integer::parseInt)
                        .toArray())
                .toList();
    }

    /** The study whose calls are known one by one. */
    static Study study(String file) {
        StudyBuilder study = Study.builder();
        Map<String, Integer> pieces = new LinkedHashMap<>();
        Map<String, Integer> appraisers = new LinkedHashMap<>();
        for (Row row : rows(file)) {
            TrueState truth = row.get("reference").equals("reject") ? TrueState.DEFECTIVE : TrueState.GOOD;
            int piece = pieces.computeIfAbsent(row.get("piece"), label -> study.piece(label, truth, null));
            int appraiser = appraisers.computeIfAbsent(row.get("appraiser"), study::appraiser);
            Call call = row.get("call").equals("reject") ? Call.REJECT : Call.ACCEPT;
            study.call(piece, appraiser, Integer.parseInt(row.get("trial")), call, Study.NO_KIND);
        }
        return study.build();
    }
}
