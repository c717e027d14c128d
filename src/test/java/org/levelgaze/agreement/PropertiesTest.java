package org.levelgaze.agreement;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Objects;
import java.util.stream.LongStream;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** What must hold for the findings of any study, over random ones; the seed is the parameter. */
class PropertiesTest {

    private static final double TOLERANCE = 1e-9;

    static LongStream seeds() {
        return LongStream.range(1_000, 1_300);
    }

    @ParameterizedTest(name = "seed {0}")
    @MethodSource("seeds")
    void exchangingAcceptWithRejectAndGoodWithDefectiveMirrorsEveryFigure(long seed) {
        RandomStudy study = RandomStudy.of(seed);
        Findings findings = study.findings();
        Findings mirrored = study.mirrored().findings();

        for (int at = 0; at < findings.appraisers().size(); at++) {
            mirror(findings.appraisers().get(at), mirrored.appraisers().get(at));
        }
        assertThat(mirrored.together().allRight()).isEqualTo(findings.together().allRight());
        assertThat(mirrored.together().allSame()).isEqualTo(findings.together().allSame());
        for (int at = 0; at < findings.together().pairs().size(); at++) {
            mirror(
                    findings.together().pairs().get(at).kappa(),
                    mirrored.together().pairs().get(at).kappa());
        }
    }

    private static void mirror(AppraiserFindings one, AppraiserFindings other) {
        assertThat(other.effectiveness()).isEqualTo(one.effectiveness());
        assertThat(other.falseAccept()).isEqualTo(one.falseReject());
        assertThat(other.falseReject()).isEqualTo(one.falseAccept());
        close(other.mcnemar().pTwoSided(), one.mcnemar().pTwoSided());
        close(other.leanTest().pTwoSided(), one.leanTest().pTwoSided());
        mirror(one.kappaToReference(), other.kappaToReference());
        close(other.ac1ToReference().ac1(), one.ac1ToReference().ac1());
        SignalDetection detection = one.signalDetection();
        SignalDetection mirrored = other.signalDetection();
        close(mirrored.dPrime(), detection.dPrime());
        close(mirrored.criterionC(), detection.criterionC() == null ? null : -detection.criterionC());
        if (detection.criterionCInterval() != null) {
            Interval interval = Objects.requireNonNull(mirrored.criterionCInterval());
            close(interval.lower(), -detection.criterionCInterval().upper());
        }
        assertThat(mirrored.lean())
                .isEqualTo(
                        switch (detection.lean()) {
                            case LENIENT -> Lean.STRICT;
                            case EVEN -> Lean.EVEN;
                            case STRICT -> Lean.LENIENT;
                        });
        mirror(one.biasRatio(), other.biasRatio());
        if (one.selfConsistency() != null) {
            SelfConsistency self = Objects.requireNonNull(other.selfConsistency());
            assertThat(self.samePiece()).isEqualTo(one.selfConsistency().samePiece());
            close(self.fleiss().kappa(), one.selfConsistency().fleiss().kappa());
            close(
                    self.krippendorffAlpha().alpha(),
                    one.selfConsistency().krippendorffAlpha().alpha());
            close(self.gwetAC1().ac1(), one.selfConsistency().gwetAC1().ac1());
        }
    }

    private static void mirror(BiasRatio one, BiasRatio other) {
        if (one.ofRates() != null && other.ofRates() != null) {
            assertThat(one.ofRates() * other.ofRates()).isCloseTo(1, within(TOLERANCE));
        }
        if (one.interval() != null && one.interval().lower() > 0) {
            Interval interval = Objects.requireNonNull(other.interval());
            assertThat(interval.upper() * one.interval().lower()).isCloseTo(1, within(1e-6));
        }
    }

    private static void mirror(CohenKappa one, CohenKappa other) {
        close(other.kappa(), one.kappa());
        close(other.seH0(), one.seH0());
        if (one.se() != null) {
            assertThat(other.se()).isCloseTo(one.se(), within(1e-8));
        }
    }

    @ParameterizedTest(name = "seed {0}")
    @MethodSource("seeds")
    void namesAndOrderChangeNothingButOrder(long seed) {
        RandomStudy study = RandomStudy.of(seed);
        Findings findings = study.findings();
        Findings renamed = study.renamed(seed).findings();

        assertThat(renamed.study()).isEqualTo(findings.study());
        for (AppraiserFindings one : findings.appraisers()) {
            AppraiserFindings other = renamed.appraisers().stream()
                    .filter(candidate -> candidate.appraiser().equals("ü" + one.appraiser()))
                    .findFirst()
                    .orElseThrow();
            assertThat(other.effectiveness()).isEqualTo(one.effectiveness());
            assertThat(other.kappaToReference()).isEqualTo(one.kappaToReference());
            assertThat(other.signalDetection()).isEqualTo(one.signalDetection());
            assertThat(other.biasRatio()).isEqualTo(one.biasRatio());
            assertThat(other.worthOfACall()).isEqualTo(one.worthOfACall());
            if (one.selfConsistency() != null) {
                SelfConsistency self = Objects.requireNonNull(other.selfConsistency());
                assertThat(self.samePieceAnyCalls())
                        .isEqualTo(one.selfConsistency().samePieceAnyCalls());
                close(
                        self.krippendorffAlpha().alpha(),
                        one.selfConsistency().krippendorffAlpha().alpha());
            }
        }
        assertThat(renamed.together().allRight()).isEqualTo(findings.together().allRight());
    }

    @ParameterizedTest(name = "seed {0}")
    @MethodSource("seeds")
    void figuresStayInTheirBounds(long seed) {
        Findings findings = RandomStudy.of(seed).findings();

        kappas(findings).forEach(kappa -> assertThat(kappa).isLessThanOrEqualTo(1 + 1e-12));
        shares(findings).filter(share -> share.value() != null).forEach(share -> {
            assertThat(share.clopperPearson().contains(share.value())).isTrue();
            assertThat(share.wilson().contains(share.value())).isTrue();
        });
        for (AppraiserFindings one : findings.appraisers()) {
            boolean noMistake = one.falseAccept().k() == 0 && one.falseReject().k() == 0;
            assertThat(one.effectiveness().byCall().k()
                            == one.effectiveness().byCall().n())
                    .isEqualTo(noMistake);
            BiasRatio ratio = one.biasRatio();
            if (ratio.interval() != null && ratio.ofRates() != null) {
                assertThat(ratio.interval().contains(ratio.ofRates())).isTrue();
            }
        }
    }

    private static Stream<Double> kappas(Findings findings) {
        return Stream.concat(
                        findings.appraisers().stream()
                                .map(one -> one.kappaToReference().kappa()),
                        findings.together().pairs().stream()
                                .map(pair -> pair.kappa().kappa()))
                .flatMap(Stream::ofNullable);
    }

    private static Stream<Share> shares(Findings findings) {
        return findings.appraisers().stream()
                .flatMap(one -> Stream.of(
                        one.effectiveness().byPiece(),
                        one.effectiveness().byPieceAnyCalls(),
                        one.effectiveness().byCall(),
                        one.falseAccept(),
                        one.falseReject()));
    }

    @ParameterizedTest(name = "1 of {0}, 2 of twice as many, ...")
    @MethodSource("smallSets")
    void intervalsNarrowWithTheNumberAtTheSameShare(int n) {
        List<Share> growing = Stream.of(1, 2, 4, 8, 16)
                .map(times -> Share.of(times, (long) n * times, 0.95))
                .toList();

        for (int at = 1; at < growing.size(); at++) {
            assertThat(width(growing.get(at).clopperPearson()))
                    .isLessThan(width(growing.get(at - 1).clopperPearson()));
            assertThat(width(growing.get(at).wilson()))
                    .isLessThan(width(growing.get(at - 1).wilson()));
        }
    }

    static Stream<Integer> smallSets() {
        return Stream.of(1, 2, 3, 10, 50, 1_000);
    }

    private static double width(Interval interval) {
        return interval.upper() - interval.lower();
    }

    private static void close(@Nullable Double found, @Nullable Double expected) {
        if (expected == null) {
            assertThat(found).isNull();
        } else {
            assertThat(found).isNotNull().isCloseTo(expected, within(TOLERANCE));
        }
    }
}
