package org.levelgaze;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.Reader;
import java.nio.charset.StandardCharsets;
import java.text.MessageFormat;
import java.util.Arrays;
import java.util.Locale;
import java.util.Objects;
import java.util.Properties;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** English and German say the same things, and each sentence names as much in one as in the other. */
class MessageBundlesTest {

    static Stream<String> bundles() throws IOException {
        Properties application = new Properties();
        try (InputStream file = resource("/application.properties")) {
            application.load(file);
        }
        return Arrays.stream(application.getProperty("spring.messages.basename").split(","));
    }

    @ParameterizedTest
    @MethodSource("bundles")
    void bothLanguagesHaveTheSameKeys(String bundle) throws IOException {
        assertThat(texts(bundle + "_de").stringPropertyNames())
                .containsExactlyInAnyOrderElementsOf(texts(bundle).stringPropertyNames());
    }

    @ParameterizedTest
    @MethodSource("bundles")
    void eachSentenceNamesAsMuchInOneLanguageAsInTheOther(String bundle) throws IOException {
        Properties german = texts(bundle + "_de");
        Properties english = texts(bundle);
        for (String key : english.stringPropertyNames()) {
            assertThat(arguments(german.getProperty(key))).as(key).isEqualTo(arguments(english.getProperty(key)));
        }
    }

    private static int arguments(String text) {
        return new MessageFormat(text, Locale.ROOT).getFormatsByArgumentIndex().length;
    }

    private static Properties texts(String name) throws IOException {
        Properties texts = new Properties();
        try (Reader file = new InputStreamReader(resource("/" + name + ".properties"), StandardCharsets.UTF_8)) {
            texts.load(file);
        }
        return texts;
    }

    private static InputStream resource(String name) {
        return Objects.requireNonNull(MessageBundlesTest.class.getResourceAsStream(name), name);
    }
}
