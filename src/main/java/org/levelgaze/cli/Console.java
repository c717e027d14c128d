package org.levelgaze.cli;

import java.io.InputStream;
import java.io.PrintStream;
import java.text.MessageFormat;
import java.util.List;
import java.util.Locale;
import java.util.ResourceBundle;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.RowError;

/**
 * Where a command reads and writes, and the language it speaks.
 *
 * @param in its input
 * @param out what it was asked for
 * @param err what stands in the way
 * @param locale the language; English where there is no translation
 */
record Console(InputStream in, PrintStream out, PrintStream err, Locale locale) {

    private static final ResourceBundle.Control NO_OTHER_LANGUAGE =
            ResourceBundle.Control.getNoFallbackControl(ResourceBundle.Control.FORMAT_PROPERTIES);

    /** A text of the commands. */
    String text(String key, Object... arguments) {
        return format("messages.cli", key, arguments);
    }

    /** The sentence of a bad row, with the number of the row. */
    String sentence(RowError error) {
        String sentence =
                format("messages.studies", error.message(), error.arguments().toArray());
        return format("messages.studies", "studies.row", Long.toString(error.row()), sentence);
    }

    /** The sentence of a refusal. */
    String sentence(Refusal refusal) {
        List<Object> arguments = refusal.arguments();
        return format("messages.studies", refusal.messageKey(), arguments.toArray());
    }

    private String format(String bundle, String key, Object... arguments) {
        String pattern =
                ResourceBundle.getBundle(bundle, locale, NO_OTHER_LANGUAGE).getString(key);
        return new MessageFormat(pattern, locale).format(arguments);
    }
}
