package org.levelgaze.plot;

import java.io.IOException;
import java.io.InputStreamReader;
import java.io.Reader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.text.MessageFormat;
import java.util.Locale;
import java.util.Objects;
import java.util.Properties;

/** The words of the message bundle {@code plot}; a missing one fails the test. */
final class BundledTexts implements Texts {

    private final Locale locale;
    private final Properties words = new Properties();

    BundledTexts(Locale locale) {
        this.locale = locale;
        String file = locale.equals(Locale.GERMAN) ? "/messages/plot_de.properties" : "/messages/plot.properties";
        try (Reader reader = new InputStreamReader(
                Objects.requireNonNull(BundledTexts.class.getResourceAsStream(file)), StandardCharsets.UTF_8)) {
            words.load(reader);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    @Override
    public String of(String key, Object... arguments) {
        String word = Objects.requireNonNull(words.getProperty(key), key);
        return arguments.length == 0 ? word : new MessageFormat(word, locale).format(arguments);
    }
}
