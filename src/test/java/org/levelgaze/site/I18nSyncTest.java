package org.levelgaze.site;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.Reader;
import java.nio.file.Files;
import java.nio.file.Path;
import java.text.MessageFormat;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Properties;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.regex.MatchResult;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** Every text in every language, and no text outside of the bundles. */
class I18nSyncTest {

    private static final Path MESSAGES = Path.of("src/main/resources/messages");
    private static final Path TEMPLATES = Path.of("src/main/resources/templates");

    /** A whole key: {@code #{site.skip}}. Keys made up from parts are {@code #{${...}}}. */
    private static final Pattern KEY = Pattern.compile("#\\{([a-zA-Z][\\w.-]*)");

    /** The fixed beginning of a key made up from parts. */
    private static final Pattern BEGINNING = Pattern.compile("#\\{\\$\\{'([\\w.-]+\\.)'");

    private static final Pattern PLACE = Pattern.compile("\\{(\\d+)");
    private static final Pattern NO_TEXT = Pattern.compile(
            "(?s)<!--/\\*.*?\\*/-->|<!--.*?-->|<!DOCTYPE[^>]*>|<(?:[^>\"']|\"[^\"]*\"|'[^']*')*>|&[a-z]+;");
    private static final Pattern NOTE = Pattern.compile("(?s)<!--.*?-->");
    private static final Pattern LETTER = Pattern.compile("\\p{L}");
    private static final Pattern SPOKEN =
            Pattern.compile("\\s(?<!th:)(title|alt|placeholder|aria-label|value)=\"([^\"]*)\"");

    @Test
    void bothLanguagesHaveTheSameKeys() throws IOException {
        for (String bundle : bundles()) {
            assertThat(load(bundle + "_de.properties").keySet())
                    .as(bundle + " in German")
                    .isEqualTo(load(bundle + ".properties").keySet());
        }
    }

    @Test
    void bothLanguagesNameTheSameThings() throws IOException {
        for (String bundle : bundles()) {
            Properties german = load(bundle + "_de.properties");
            load(bundle + ".properties")
                    .forEach((key, text) -> assertThat(places(german.getProperty(key.toString())))
                            .as(bundle + ": " + key)
                            .isEqualTo(places(text.toString())));
        }
    }

    @Test
    void aTextThatNamesThingsCanBeFormatted() throws IOException {
        for (String bundle : bundles()) {
            for (String file : List.of(bundle + ".properties", bundle + "_de.properties")) {
                load(file).forEach((key, text) -> checkFormat(file, key.toString(), text.toString()));
            }
        }
    }

    /** A single apostrophe would swallow what follows it. */
    private static void checkFormat(String file, String key, String text) {
        if (text.contains("{")) {
            String formatted = new MessageFormat(text, Locale.ENGLISH).toPattern();
            assertThat(places(formatted)).as(file + ": " + key).isEqualTo(places(text));
            assertThat(text.replace("''", "")).as(file + ": " + key).doesNotContain("'");
        }
    }

    @Test
    void noKeyStandsInTwoBundles() throws IOException {
        Map<String, String> seen = new TreeMap<>();
        for (String bundle : bundles()) {
            for (Object key : load(bundle + ".properties").keySet()) {
                String before = seen.put(key.toString(), bundle);
                assertThat(before).as(key + " stands in " + bundle + " too").isNull();
            }
        }
    }

    @Test
    void everyTextThatATemplateAsksForExists() throws IOException {
        Set<String> keys = new TreeSet<>();
        for (String bundle : bundles()) {
            load(bundle + ".properties").keySet().forEach(key -> keys.add(key.toString()));
        }
        for (Path template : templates()) {
            String html = NOTE.matcher(Files.readString(template)).replaceAll("");
            assertThat(keys).as(template.toString()).containsAll(found(KEY, html));
            assertThat(found(BEGINNING, html))
                    .as(template.toString())
                    .allSatisfy(beginning ->
                            assertThat(keys).anySatisfy(key -> assertThat(key).startsWith(beginning)));
        }
    }

    @Test
    void templatesHaveNoTextOfTheirOwn() throws IOException {
        assertThat(templates()).isNotEmpty();
        for (Path template : templates()) {
            assertThat(ownText(Files.readString(template)))
                    .as(template.toString())
                    .isEmpty();
        }
    }

    @Test
    void aTextInATemplateWouldBeNoticed() {
        assertThat(ownText("<p th:text=\"#{a.b}\"></p><p>Hello</p>")).containsExactly("Hello");
        assertThat(ownText("<input placeholder=\"Code\" th:value=\"${x}\">")).containsExactly("Code");
        assertThat(ownText("<p th:if=\"${a > b}\">· – ()</p><!--/* a note */--><b th:title=\"#{a.b}\"></b>"))
                .isEmpty();
        assertThat(found(KEY, "th:text=\"#{a.b(${c})} + #{d.e-f}\" #{${'x.y.' + z}}"))
                .containsExactly("a.b", "d.e-f");
    }

    private static List<String> ownText(String html) {
        List<String> own = new ArrayList<>();
        Stream.of(NO_TEXT.matcher(html).replaceAll("\n").split("\n", -1))
                .map(String::strip)
                .filter(text -> LETTER.matcher(text).find())
                .forEach(own::add);
        SPOKEN.matcher(html)
                .results()
                .map(found -> found.group(2))
                .filter(text -> LETTER.matcher(text).find())
                .forEach(own::add);
        return own;
    }

    private static Set<String> places(String text) {
        return new TreeSet<>(found(PLACE, text));
    }

    private static List<String> found(Pattern pattern, String text) {
        return pattern.matcher(text)
                .results()
                .map((MatchResult match) -> match.group(1))
                .toList();
    }

    private static List<String> bundles() throws IOException {
        try (Stream<Path> files = Files.list(MESSAGES)) {
            return files.map(file -> file.getFileName().toString())
                    .filter(name -> !name.contains("_"))
                    .map(name -> name.replace(".properties", ""))
                    .sorted()
                    .collect(Collectors.toList());
        }
    }

    private static List<Path> templates() throws IOException {
        try (Stream<Path> files = Files.walk(TEMPLATES)) {
            return files.filter(file -> file.toString().endsWith(".html")).toList();
        }
    }

    private static Properties load(String file) throws IOException {
        Properties properties = new Properties();
        try (Reader reader = Files.newBufferedReader(MESSAGES.resolve(file))) {
            properties.load(reader);
        }
        return properties;
    }
}
