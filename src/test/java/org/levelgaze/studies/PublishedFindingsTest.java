package org.levelgaze.studies;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.InputStream;
import java.util.Objects;
import org.junit.jupiter.api.DisplayName;
import org.junit.jupiter.api.Test;
import org.levelgaze.agreement.Engine;
import org.levelgaze.agreement.Findings;
import org.levelgaze.agreement.Terms;
import org.levelgaze.studies.reading.CallReader;
import org.levelgaze.studies.reading.Reading;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** The whole of the findings of a published study, from its file of calls to the JSON form. */
class PublishedFindingsTest {

    /** Every number of the contract. */
    private static final double TOLERANCE = 1e-9;
    /** Limits of a ratio are found by root search. */
    private static final double TOLERANCE_OF_RATIO_LIMITS = 1e-6;

    private static final JsonMapper JSON = JsonMapper.builder().build();

    @Test
    @DisplayName(
            "AIAG MSA 4th ed., 50 pieces x 3 appraisers x 3 trials (calls from memory, findings by plain formulas)")
    void reproducesThePublishedStudyWhole() throws IOException {
        JsonNode expected = JSON.readTree(resource("aiag_msa4_findings.json"));

        JsonNode found = JSON.readTree(FindingsJson.write(assessed()));

        compare(expected, found, "");
    }

    @Test
    void readsBackWhatItWrites() throws IOException {
        Findings findings = assessed();

        assertThat(FindingsJson.read(FindingsJson.write(findings))).isEqualTo(findings);
        assertThat(FindingsJson.read(FindingsJson.writeIndented(findings))).isEqualTo(findings);
    }

    private static Findings assessed() throws IOException {
        Reading reading = CallReader.standard().read(resource("aiag_msa4_calls.csv"));
        return Engine.assess(((Reading.Read) reading).calls().toStudy(), Terms.STANDARD);
    }

    private static void compare(JsonNode expected, JsonNode found, String path) {
        if (expected.isNumber()) {
            double tolerance = path.contains("/biasRatio/interval") ? TOLERANCE_OF_RATIO_LIMITS : TOLERANCE;
            assertThat(found.isNumber()).as(path).isTrue();
            assertThat(found.asDouble())
                    .as(path)
                    .isCloseTo(expected.asDouble(), org.assertj.core.api.Assertions.within(tolerance));
        } else if (expected.isObject()) {
            assertThat(found.propertyNames()).as(path).containsExactlyInAnyOrderElementsOf(expected.propertyNames());
            expected.propertyNames().forEach(name -> compare(expected.get(name), found.get(name), path + "/" + name));
        } else if (expected.isArray()) {
            assertThat(found.size()).as(path).isEqualTo(expected.size());
            for (int at = 0; at < expected.size(); at++) {
                compare(expected.get(at), found.get(at), path + "/" + at);
            }
        } else {
            assertThat(found).as(path).isEqualTo(expected);
        }
    }

    private static InputStream resource(String name) {
        return Objects.requireNonNull(PublishedFindingsTest.class.getResourceAsStream("/reference/" + name), name);
    }
}
