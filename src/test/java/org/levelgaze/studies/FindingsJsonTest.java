package org.levelgaze.studies;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import org.levelgaze.agreement.Call;
import org.levelgaze.agreement.Engine;
import org.levelgaze.agreement.Findings;
import org.levelgaze.agreement.Study;
import org.levelgaze.agreement.StudyBuilder;
import org.levelgaze.agreement.Terms;
import org.levelgaze.agreement.TrueState;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

class FindingsJsonTest {

    private static Findings oneAppraiserWithoutAMistake(boolean withKinds) {
        StudyBuilder study = Study.builder();
        study.piece("rim", TrueState.GOOD, null);
        study.piece("lid", TrueState.DEFECTIVE, withKinds ? "chip" : null);
        study.appraiser("Ana");
        study.call(0, 0, 1, Call.REJECT, null).call(1, 0, 1, Call.REJECT, withKinds ? "chip" : null);
        return Engine.assess(study.build(), new Terms(0.9, 0.002));
    }

    private static JsonNode json(Findings findings) {
        return JsonMapper.builder().build().readTree(FindingsJson.write(findings));
    }

    @Test
    void writesNullWhereNothingIsDefinedAndSaysWhy() {
        JsonNode json = json(oneAppraiserWithoutAMistake(false));
        JsonNode ana = json.get("appraisers").get(0);

        assertThat(ana.get("selfConsistency").isNull()).isTrue();
        assertThat(ana.get("biasRatio").get("status").asString()).isEqualTo("infinite");
        assertThat(ana.get("biasRatio").get("ofRates").isNull()).isTrue();
        assertThat(ana.get("biasRatio").get("interval").get(1).isNull()).isTrue();
        assertThat(ana.get("kappaToReference").has("undefined")).isFalse();
        assertThat(ana.has("byDefectKind")).isFalse();
        assertThat(ana.get("worthOfACall").propertyNames()).containsExactly("0.001", "0.01", "0.05", "0.002");
        assertThat(json.get("together").get("fleiss").isNull()).isTrue();
        assertThat(json.get("together").get("allSame").isNull()).isTrue();
        assertThat(json.get("together").get("pairs").size()).isZero();
    }

    @Test
    void namesTheReasonBesideAnUndefinedKappa() {
        StudyBuilder study = Study.builder();
        study.piece("rim", TrueState.GOOD, null);
        study.appraiser("Ana");
        study.call(0, 0, 1, Call.ACCEPT, null);

        JsonNode ana = json(Engine.assess(study.build(), Terms.STANDARD))
                .get("appraisers")
                .get(0);

        assertThat(ana.get("kappaToReference").get("kappa").isNull()).isTrue();
        assertThat(ana.get("kappaToReference").get("undefined").asString()).startsWith("chance agreement is 1");
        assertThat(ana.get("falseAccept").get("value").isNull()).isTrue();
        assertThat(ana.get("signalDetection").get("undefined").asString()).isNotBlank();
    }

    @Test
    void writesKindsOnlyWhereTheyAreKnownAndReadsAllBack() {
        Findings findings = oneAppraiserWithoutAMistake(true);

        JsonNode kind =
                json(findings).get("appraisers").get(0).get("byDefectKind").get(0);

        assertThat(kind.get("kind").asString()).isEqualTo("chip");
        assertThat(kind.get("named").get("k").asInt()).isEqualTo(1);
        assertThat(FindingsJson.read(FindingsJson.write(findings))).isEqualTo(findings);
    }
}
