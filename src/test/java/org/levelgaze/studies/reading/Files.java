package org.levelgaze.studies.reading;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.text.MessageFormat;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.ResourceBundle;
import org.levelgaze.agreement.Study;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.RowError;

/** Small files for the tests of the reader, and what became of them in words. */
final class Files {

    static final String HEADER = "piece,reference,appraiser,trial,call\n";

    private Files() {}

    static InputStream bytes(String text) {
        return new ByteArrayInputStream(text.getBytes(StandardCharsets.UTF_8));
    }

    static Reading read(String text) {
        return read(CallReader.standard(), bytes(text));
    }

    static Reading read(CallReader reader, InputStream file) {
        try {
            return reader.read(file);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    static RecordedCalls calls(String text) {
        return ((Reading.Read) read(text)).calls();
    }

    /** The sentences of the bad rows, in English. */
    static List<String> complaints(Reading reading) {
        return ((Reading.Refused) reading).first().stream().map(Files::sentence).toList();
    }

    static List<String> complaints(String text) {
        return complaints(read(text));
    }

    static String sentence(RowError error) {
        return text(
                "studies.row",
                Long.toString(error.row()),
                text(error.message(), error.arguments().toArray()));
    }

    static String sentence(Refusal refusal) {
        return text(refusal.messageKey(), refusal.arguments().toArray());
    }

    /** The calls as rows of text. */
    static List<String> rows(RecordedCalls calls) {
        List<String> rows = new ArrayList<>();
        calls.forEachCall((piece, appraiser, trial, call, seen) ->
                rows.add(calls.pieces().get(piece).label() + " "
                        + calls.appraisers().get(appraiser) + " " + trial + " " + call
                        + (seen == Study.NO_KIND ? "" : " " + calls.kinds().get(seen))));
        return rows;
    }

    private static String text(String key, Object... arguments) {
        ResourceBundle texts = ResourceBundle.getBundle("messages.studies", Locale.ROOT);
        return new MessageFormat(texts.getString(key), Locale.ROOT).format(arguments);
    }
}
