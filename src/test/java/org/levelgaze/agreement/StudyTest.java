package org.levelgaze.agreement;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import org.junit.jupiter.api.Test;

class StudyTest {

    @Test
    void showsItsCallsInOrderWhateverTheOrderInWhichTheyCame() {
        StudyBuilder builder = Study.builder(1);
        builder.piece("rim", TrueState.GOOD, null);
        builder.piece("lid", TrueState.DEFECTIVE, "chip");
        builder.appraiser("Ana");
        builder.appraiser("Bo");
        builder.call(1, 1, 2, Call.REJECT, "crack")
                .call(0, 0, 5_000, Call.ACCEPT, null)
                .call(1, 0, 1, Call.REJECT, "chip")
                .call(0, 0, 1, Call.ACCEPT, Study.NO_KIND);

        Study study = builder.build();
        List<String> calls = new ArrayList<>();
        study.forEachCall((piece, appraiser, trial, call, seen) ->
                calls.add(study.appraisers().get(appraiser) + " "
                        + study.pieces().get(piece).label() + " " + trial + " " + call + " "
                        + (seen == Study.NO_KIND ? "-" : study.kinds().get(seen))));

        assertThat(calls)
                .containsExactly(
                        "Ana rim 1 ACCEPT -",
                        "Ana rim 5000 ACCEPT -",
                        "Ana lid 1 REJECT chip",
                        "Bo lid 2 REJECT crack");
        assertThat(study.trials(0)).isEqualTo(5_000);
        assertThat(study.trials(1)).isEqualTo(2);
        assertThat(study.calls()).isEqualTo(4);
        assertThat(study.kinds()).containsExactly("chip", "crack");
    }

    @Test
    void showsCallsWithoutAnyKind() {
        StudyBuilder builder = Study.builder();
        builder.piece("rim", TrueState.GOOD, null);
        builder.appraiser("Ana");
        builder.call(0, 0, 1, Call.REJECT, null);
        List<Integer> seen = new ArrayList<>();

        builder.build().forEachCall((piece, appraiser, trial, call, kind) -> seen.add(kind));

        assertThat(seen).containsExactly(Study.NO_KIND);
    }

    @Test
    void refusesTheSameCallTwice() {
        StudyBuilder builder = Study.builder();
        builder.piece("rim", TrueState.GOOD, null);
        builder.piece("lid", TrueState.GOOD, null);
        builder.appraiser("Ana");
        builder.call(1, 0, 2, Call.ACCEPT, null)
                .call(0, 0, 2, Call.ACCEPT, null)
                .call(1, 0, 1, Call.ACCEPT, null)
                .call(1, 0, 2, Call.REJECT, null);

        assertThatThrownBy(builder::build).hasMessage("Piece lid, appraiser Ana, trial 2 is called twice");
    }

    @Test
    void refusesWhatIsNotThere() {
        StudyBuilder builder = Study.builder();
        builder.piece("rim", TrueState.GOOD, null);
        builder.appraiser("Ana");

        assertThatThrownBy(() -> builder.call(1, 0, 1, Call.ACCEPT, null)).hasMessageContaining("no piece at place 1");
        assertThatThrownBy(() -> builder.call(-1, 0, 1, Call.ACCEPT, null))
                .hasMessageContaining("no piece at place -1");
        assertThatThrownBy(() -> builder.call(0, 1, 1, Call.ACCEPT, null))
                .hasMessageContaining("no appraiser at place 1");
        assertThatThrownBy(() -> builder.call(0, -1, 1, Call.ACCEPT, null)).hasMessageContaining("place -1");
        assertThatThrownBy(() -> builder.call(0, 0, 0, Call.ACCEPT, null))
                .hasMessage("Trials are numbered from 1, not 0");
        assertThatThrownBy(() -> builder.call(0, 0, 1, Call.ACCEPT, 0))
                .hasMessageContaining("no defect kind at place 0");
        assertThatThrownBy(() -> builder.call(0, 0, 1, Call.ACCEPT, -2)).hasMessageContaining("place -2");
        assertThatThrownBy(() -> builder.piece("rim", TrueState.GOOD, null)).hasMessageContaining("two pieces 'rim'");
        assertThatThrownBy(() -> builder.appraiser("Ana")).hasMessageContaining("two appraisers 'Ana'");
    }

    @Test
    void aStudyWithoutAnythingHasFindings() {
        Findings findings = Engine.assess(Study.builder().build(), Terms.STANDARD);

        assertThat(findings.study()).isEqualTo(new StudyShape(0, 0, 0, 0, 0, 0, 0));
        assertThat(findings.appraisers()).isEmpty();
        assertThat(findings.together().allRight().value()).isNull();
        assertThat(findings.together().allSame()).isNull();
    }

    @Test
    void piecesAndAppraisersWithoutACallAreListed() {
        StudyBuilder builder = Study.builder();
        builder.piece("rim", TrueState.GOOD, null);
        builder.piece("lid", TrueState.DEFECTIVE, null);
        builder.appraiser("Ana");
        builder.appraiser("Bo");
        builder.call(0, 0, 1, Call.ACCEPT, null);

        Findings findings = Engine.assess(builder.build(), Terms.STANDARD);

        assertThat(findings.study()).isEqualTo(new StudyShape(2, 1, 1, 2, 1, 2, 1));
        AppraiserFindings bo = findings.appraisers().get(1);
        assertThat(bo.calls()).isZero();
        assertThat(bo.effectiveness().byPiece().n()).isZero();
        assertThat(bo.kappaToReference().undefined()).isEqualTo("there is no call");
        assertThat(findings.together().allRight()).isEqualTo(Share.of(1, 1, 0.95));
        assertThat(findings.together().allSame()).isNull();
        assertThat(Objects.requireNonNull(findings.together().fleiss()).undefined())
                .isEqualTo("there is one call per piece");
    }

    @Test
    void takesAMillionCallsInOneGo() {
        int pieces = 2_000;
        int trials = 500;
        StudyBuilder builder = Study.builder(pieces * trials);
        builder.appraiser("RIM-CAM");
        for (int piece = 0; piece < pieces; piece++) {
            builder.piece("P" + piece, piece % 2 == 0 ? TrueState.GOOD : TrueState.DEFECTIVE, null);
            for (int trial = trials; trial >= 1; trial--) {
                boolean wrong = piece % 100 == 0 && trial % 10 == 0;
                builder.call(piece, 0, trial, piece % 2 == 0 && !wrong ? Call.ACCEPT : Call.REJECT, null);
            }
        }

        AppraiserFindings camera =
                Engine.assess(builder.build(), Terms.STANDARD).appraisers().get(0);

        assertThat(camera.calls()).isEqualTo(1_000_000);
        assertThat(camera.falseReject().k()).isEqualTo(20 * 50);
        assertThat(camera.effectiveness().byPiece().k()).isEqualTo(1_980);
        assertThat(camera.mcnemar().pTwoSided()).isLessThan(1e-100);
    }

    @Test
    void memoryGrowsWithTheCallsNotWithPiecesTimesTrials() {
        int pieces = 100_000;
        StudyBuilder builder = Study.builder(pieces);
        for (int appraiser = 0; appraiser < 100; appraiser++) {
            builder.appraiser("A" + appraiser);
        }
        for (int piece = 0; piece < pieces; piece++) {
            builder.piece("P" + piece, TrueState.GOOD, null);
            builder.call(piece, piece % 100, 1 + piece * 7, Call.ACCEPT, null);
        }

        Findings findings = Engine.assess(builder.build(), Terms.STANDARD);

        assertThat(findings.study().callsMade()).isEqualTo(pieces);
        assertThat(findings.together().pairs()).hasSize(4_950);
    }
}
