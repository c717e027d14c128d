package org.levelgaze.studies.importing;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Locale;
import org.springframework.core.io.ClassPathResource;

/** Files that show what can be brought. */
enum Examples {
    /** One row for each call. */
    LONG,
    /** One column for each appraiser and trial. */
    WIDE;

    String fileName() {
        return "example-" + name().toLowerCase(Locale.ROOT) + ".csv";
    }

    String text() {
        try {
            return new ClassPathResource("studies/" + fileName()).getContentAsString(StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
