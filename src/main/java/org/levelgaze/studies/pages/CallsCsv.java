package org.levelgaze.studies.pages;

import java.io.IOException;
import java.io.OutputStream;
import java.io.OutputStreamWriter;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVPrinter;
import org.levelgaze.studies.StudyHead;
import org.springframework.stereotype.Component;

/** Writes the calls of a study as CSV (RFC 4180, UTF-8), call by call. */
@Component
class CallsCsv {

    private final CallLines lines;

    CallsCsv(CallLines lines) {
        this.lines = lines;
    }

    void write(StudyHead study, OutputStream out) throws IOException {
        try (CSVPrinter csv = new CSVPrinter(new OutputStreamWriter(out, StandardCharsets.UTF_8), CSVFormat.RFC4180)) {
            lines.forEach(study, line -> print(csv, line));
        } catch (UncheckedIOException e) {
            throw e.getCause();
        }
    }

    private static void print(CSVPrinter csv, List<String> line) {
        try {
            csv.printRecord(line);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
