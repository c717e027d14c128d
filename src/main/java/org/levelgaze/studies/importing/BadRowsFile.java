package org.levelgaze.studies.importing;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.io.OutputStreamWriter;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Locale;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVPrinter;
import org.levelgaze.shared.RowError;
import org.levelgaze.studies.SafeCell;
import org.levelgaze.studies.StudyImport;
import org.levelgaze.studies.reading.CallReader;
import org.levelgaze.studies.reading.Reading;
import org.levelgaze.studies.reading.Watcher;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;

/** Writes all rows that stood in the way of an import as CSV. They are not kept: the file is read once more. */
@Component
class BadRowsFile {

    private final Uploads uploads;
    private final StudyImport imports;
    private final MessageSource messages;

    BadRowsFile(Uploads uploads, StudyImport imports, MessageSource messages) {
        this.uploads = uploads;
        this.imports = imports;
        this.messages = messages;
    }

    void write(Upload upload, ImportOrder order, Locale locale, OutputStream target) throws IOException {
        OutputStreamWriter text = new OutputStreamWriter(target, StandardCharsets.UTF_8);
        CSVPrinter printer = new CSVPrinter(text, CSVFormat.RFC4180);
        for (String column : new String[] {"row", "column", "value", "message"}) {
            printer.print(messages.getMessage("site.rows." + column, null, locale));
        }
        printer.println();
        Mapping mapping = order.mapping();
        CallReader reader = new CallReader(mapping.layout(), mapping.words().withKnown());
        try (InputStream content = uploads.content(upload)) {
            Reading reading = reader.read(content, Watcher.NONE, row -> print(row, printer, locale));
            if (reading instanceof Reading.Read read) {
                imports.findMisfits(upload.site(), order.set(), read.calls(), row -> print(row, printer, locale));
            }
        }
        printer.flush();
    }

    private void print(RowError row, CSVPrinter printer, Locale locale) {
        String sentence = messages.getMessage(row.message(), row.arguments().toArray(), locale);
        try {
            printer.printRecord(row.row(), SafeCell.of(row.column()), SafeCell.of(row.value()), SafeCell.of(sentence));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
