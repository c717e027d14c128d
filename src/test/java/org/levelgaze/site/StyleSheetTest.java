package org.levelgaze.site;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Objects;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The tokens of the style sheet, held against WCAG 2.2: 4.5 to 1 for text (1.4.3), 3 to 1 for marks and controls (1.4.11). */
class StyleSheetTest {

    private static final Pattern TOKEN = Pattern.compile("--([a-z-]+): #([0-9a-f]{6});");

    @ParameterizedTest
    @ValueSource(strings = {"light", "dark"})
    void textCanBeRead(String theme) throws IOException {
        Map<String, Integer> tokens = tokens(theme);
        for (String ground : new String[] {"paper", "sheet", "wash"}) {
            for (String ink : new String[] {"ink", "ink-soft", "accent", "strict", "lenient", "even", "fault"}) {
                assertThat(contrast(tokens, ink, ground))
                        .as(ink + " on " + ground)
                        .isGreaterThanOrEqualTo(4.5);
            }
        }
        assertThat(contrast(tokens, "on-accent", "accent")).isGreaterThanOrEqualTo(4.5);
    }

    @ParameterizedTest
    @ValueSource(strings = {"light", "dark"})
    void controlsAndMarksCanBeSeen(String theme) throws IOException {
        Map<String, Integer> tokens = tokens(theme);
        for (String ground : new String[] {"paper", "sheet", "wash"}) {
            assertThat(contrast(tokens, "edge", ground)).as("edge on " + ground).isGreaterThanOrEqualTo(3);
        }
    }

    @Test
    void darkIsTheSameByChoiceAndByDevice() throws IOException {
        assertThat(tokens("dark")).isEqualTo(tokens("device")).hasSameSizeAs(tokens("light"));
    }

    /** The relative luminance of the definition in WCAG 2.2; black on white is 21 to 1 there. */
    @ParameterizedTest
    @CsvSource({"000000, ffffff, 21.0", "ffffff, ffffff, 1.0", "777777, ffffff, 4.48"})
    void contrastIsThatOfTheDefinition(String one, String other, double expected) {
        Map<String, Integer> tokens = Map.of("a", Integer.parseInt(one, 16), "b", Integer.parseInt(other, 16));
        assertThat(contrast(tokens, "a", "b")).isEqualTo(expected, within(0.005));
    }

    @Test
    void asksNothingOfOtherHosts() throws IOException {
        assertThat(css()).doesNotContain("http:", "https:", "url(//", "@import");
    }

    private static Map<String, Integer> tokens(String theme) throws IOException {
        String start = switch (theme) {
            case "light" -> ":root {";
            case "dark" -> ":root[data-theme=\"dark\"] {";
            default -> ":root:not([data-theme=\"light\"]) {";
        };
        int from = css().indexOf(start);
        assertThat(from).as(start).isNotNegative();
        Map<String, Integer> tokens = new LinkedHashMap<>();
        TOKEN.matcher(css().substring(from, css().indexOf('}', from)))
                .results()
                .forEach(found -> tokens.put(found.group(1), Integer.parseInt(found.group(2), 16)));
        return tokens;
    }

    private static double contrast(Map<String, Integer> tokens, String one, String other) {
        double a = luminance(Objects.requireNonNull(tokens.get(one), one));
        double b = luminance(Objects.requireNonNull(tokens.get(other), other));
        return (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05);
    }

    private static double luminance(int colour) {
        return 0.2126 * linear(colour >> 16) + 0.7152 * linear((colour >> 8) & 0xff) + 0.0722 * linear(colour & 0xff);
    }

    private static double linear(int channel) {
        double c = channel / 255.0;
        return c <= 0.04045 ? c / 12.92 : Math.pow((c + 0.055) / 1.055, 2.4);
    }

    private static String css() throws IOException {
        String sheet = "/static/css/levelgaze.css";
        try (var stored = Objects.requireNonNull(StyleSheetTest.class.getResourceAsStream(sheet), sheet)) {
            return new String(stored.readAllBytes(), StandardCharsets.UTF_8);
        }
    }
}
