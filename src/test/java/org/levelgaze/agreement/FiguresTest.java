package org.levelgaze.agreement;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Objects;
import org.apache.commons.statistics.distribution.BetaDistribution;
import org.apache.commons.statistics.distribution.HypergeometricDistribution;
import org.junit.jupiter.api.DisplayName;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Single figures against hand calculations, at 0, 1 and more, and the edges at which they are undefined. */
class FiguresTest {

    private static final double Z = Normal.twoSided(0.95);

    @ParameterizedTest(name = "{0} of {1} is {2}")
    @CsvSource({"18, 20, 0.9", "1, 2, 0.5", "0, 7, 0", "7, 7, 1"})
    @DisplayName("shares of plain counts (common practice, no source)")
    void sharesOfPlainCounts(long k, long n, double value) {
        assertThat(Share.of(k, n, 0.95).value()).isEqualTo(value);
    }

    @Test
    @DisplayName("1 of 10 kept back against 2 of 10 let out is a ratio of 0.5 (common practice, no source)")
    void halfAsManyFalseRejectsAsFalseAccepts() {
        BiasRatio ratio = BiasRatio.of(Share.of(1, 10, 0.95), Share.of(2, 10, 0.95), 0.95);

        assertThat(ratio.ofRates()).isEqualTo(0.5);
        assertThat(ratio.ofCounts()).isEqualTo(0.5);
        assertThat(ratio.status()).isEqualTo(BiasRatio.Status.FINITE);
    }

    @Test
    @DisplayName("a study of 20 pieces at 90 % leaves 68 % to 99 % (findings of the plain formula)")
    void twentyPiecesLeaveMuchOpen() {
        Interval interval = Share.of(18, 20, 0.95).clopperPearson();

        assertThat(interval.lower()).isCloseTo(0.68, within(0.005));
        assertThat(interval.upper()).isCloseTo(0.99, within(0.005));
    }

    @Test
    @DisplayName("Koopman, Biometrics 40 (1984) 513-517: 36/40 against 16/80 gives 2.94 to 7.15 (from memory)")
    void koopmansExample() {
        Interval interval = Objects.requireNonNull(RatioInterval.koopman(36, 40, 16, 80, 0.95));

        assertThat(interval.lower()).isCloseTo(2.94, within(0.005));
        assertThat(interval.upper()).isCloseTo(7.15, within(0.005));
    }

    @ParameterizedTest(name = "{0}/{1} against {2}/{3}")
    @CsvSource({"36,40,16,80", "5,102,3,48", "1,3,2,5", "7,7,2,9", "3,9,9,9", "1,1000000,3,7", "400,401,399,402"})
    @DisplayName("at the limits, Koopman's own statistic equals z squared (his formula, as an oracle)")
    void limitsOfTheRatioAreWhereKoopmansStatisticSaysSo(long x1, long n1, long x2, long n2) {
        Interval interval = Objects.requireNonNull(RatioInterval.koopman(x1, n1, x2, n2, 0.95));

        for (double ratio : new double[] {interval.lower(), interval.upper()}) {
            double b = ratio * (n1 + x2) + x1 + n2;
            double p1 = (b - Math.sqrt(b * b - 4 * ratio * (n1 + n2) * (x1 + x2))) / (2 * (n1 + n2));
            double u = Math.pow(x1 - n1 * p1, 2) / (n1 * p1 * (1 - p1)) * (1 + n1 * (ratio - p1) / (n2 * (1 - p1)));
            if (p1 < 1 && p1 / ratio < 1 - 1e-9) {
                assertThat(u).isCloseTo(Z * Z, within(1e-3));
            }
        }
    }

    @Test
    void ratioIntervalsAreOpenWhereOneSideHasNoMistake() {
        Interval noFalseReject = Objects.requireNonNull(RatioInterval.koopman(0, 10, 2, 10, 0.95));
        Interval noFalseAccept = Objects.requireNonNull(RatioInterval.koopman(2, 10, 0, 10, 0.95));

        assertThat(noFalseReject.lower()).isZero();
        assertThat(noFalseReject.upper()).isPositive().isFinite();
        assertThat(noFalseAccept.lower()).isPositive();
        assertThat(noFalseAccept.upper()).isInfinite();
        assertThat(noFalseAccept.lower() * noFalseReject.upper()).isCloseTo(1, within(1e-6));
        assertThat(RatioInterval.koopman(0, 10, 0, 10, 0.95)).isNull();
        assertThat(RatioInterval.koopman(0, 0, 1, 10, 0.95)).isNull();
        assertThat(RatioInterval.koopman(1, 10, 0, 0, 0.95)).isNull();
    }

    @Test
    void ratioOfTwoFullSharesHoldsOne() {
        Interval interval = Objects.requireNonNull(RatioInterval.koopman(10, 10, 10, 10, 0.95));

        assertThat(interval.contains(1)).isTrue();
        assertThat(interval.lower() * interval.upper()).isCloseTo(1, within(1e-6));
    }

    @Test
    void biasRatioSaysWhyItIsNoNumber() {
        Share none = Share.of(0, 10, 0.95);
        Share some = Share.of(3, 10, 0.95);
        Share unjudged = Share.of(0, 0, 0.95);

        BiasRatio infinite = BiasRatio.of(some, none, 0.95);
        assertThat(infinite.status().text()).isEqualTo("infinite");
        assertThat(infinite.ofRates()).isNull();
        assertThat(infinite.ofCounts()).isNull();
        BiasRatio neither = BiasRatio.of(none, none, 0.95);
        assertThat(neither.status().text()).isEqualTo("undefined (0/0)");
        assertThat(neither.interval()).isNull();
        assertThat(BiasRatio.of(unjudged, some, 0.95).status()).isEqualTo(BiasRatio.Status.UNDEFINED);
        assertThat(BiasRatio.of(some, unjudged, 0.95).status()).isEqualTo(BiasRatio.Status.UNDEFINED);
        assertThat(BiasRatio.of(none, some, 0.95).ofRates()).isZero();
    }

    @ParameterizedTest
    @CsvSource({"1,2", "3,1000", "999,1000", "5000,10000", "17,1000000", "999983,1000000"})
    @DisplayName("Clopper-Pearson at large numbers (commons-statistics, another library)")
    void exactLimitsHoldForLargeNumbers(long k, long n) {
        for (double confidence : new double[] {0.5, 0.9, 0.95, 0.999}) {
            Interval interval = Share.of(k, n, confidence).clopperPearson();
            double tail = (1 - confidence) / 2;

            assertThat(interval.lower())
                    .isCloseTo(
                            BetaDistribution.of((double) k, n - k + 1.0).inverseCumulativeProbability(tail),
                            within(1e-12));
            assertThat(interval.upper())
                    .isCloseTo(
                            BetaDistribution.of(k + 1.0, (double) (n - k)).inverseSurvivalProbability(tail),
                            within(1e-12));
        }
    }

    @Test
    @DisplayName("Fisher's test with many calls (hypergeometric distribution of commons-statistics)")
    void leanTestHoldsForManyCalls() {
        int first = 60_000;
        int second = 90_000;
        int mistakes = 5_000;
        int found = 2_060;
        HypergeometricDistribution tables = HypergeometricDistribution.of(first + second, first, mistakes);
        double limit = tables.logProbability(found) + 1e-9;
        double expected = 0;
        for (int x = 0; x <= mistakes; x++) {
            expected += tables.logProbability(x) <= limit ? tables.probability(x) : 0;
        }

        assertThat(LeanTest.of(found, first, mistakes - found, second).pTwoSided())
                .isCloseTo(expected, within(1e-9));
    }

    @Test
    void testsOfNothingSayOne() {
        assertThat(LeanTest.of(0, 0, 0, 0).pTwoSided()).isEqualTo(1);
        assertThat(LeanTest.of(0, 5, 0, 7).pTwoSided()).isEqualTo(1);
        assertThat(LeanTest.of(3, 5, 0, 0).pTwoSided()).isEqualTo(1);
        assertThat(McNemar.of(0, 0).pTwoSided()).isEqualTo(1);
        assertThat(McNemar.of(4, 4).pTwoSided()).isEqualTo(1);
    }

    @Test
    void testsOfManyMistakesStayNumbers() {
        assertThat(McNemar.of(0, 1_000_000).pTwoSided()).isZero();
        assertThat(McNemar.of(0, 40).pTwoSided()).isCloseTo(2 * Math.pow(0.5, 40), within(1e-20));
        assertThat(LeanTest.of(500_000, 500_000, 0, 500_000).pTwoSided()).isZero();
    }

    @Test
    @DisplayName("10/10 and 0/170 give c = +0.53 (plain formula), which is no lean")
    void aFlawlessAppraiserHasNoLean() {
        SignalDetection detection = SignalDetection.of(10, 10, 0, 170, Z);

        assertThat(detection.criterionC()).isCloseTo(0.53, within(0.005));
        assertThat(detection.lean()).isEqualTo(Lean.EVEN);
    }

    @Test
    void leanNeedsAnIntervalThatLeavesOutZero() {
        assertThat(SignalDetection.of(20, 50, 1, 50, Z).lean()).isEqualTo(Lean.LENIENT);
        assertThat(SignalDetection.of(49, 50, 30, 50, Z).lean()).isEqualTo(Lean.STRICT);
        assertThat(SignalDetection.of(45, 50, 5, 50, Z).lean()).isEqualTo(Lean.EVEN);
        assertThat(SignalDetection.of(3, 5, 0, 0, Z).lean()).isEqualTo(Lean.EVEN);
    }

    @Test
    void worthIsUndefinedWhereNothingIsRejectedOrAccepted() {
        WorthOfACall nothingRejected = WorthOfACall.at(0.01, 1.0, 0.0);
        WorthOfACall nothingAccepted = WorthOfACall.at(0.01, 0.0, 1.0);

        assertThat(nothingRejected.rejectShare()).isZero();
        assertThat(nothingRejected.ppvDefectiveGivenReject()).isNull();
        assertThat(nothingRejected.goodAmongRejected()).isNull();
        assertThat(nothingRejected.defectiveAmongAccepted()).isEqualTo(0.01);
        assertThat(nothingAccepted.npvGoodGivenAccept()).isNull();
        assertThat(nothingAccepted.defectiveAmongAccepted()).isNull();
        assertThat(nothingAccepted.ppvDefectiveGivenReject()).isEqualTo(0.01);
    }

    @Test
    void theTasksOwnRateIsOneMoreEntry() {
        Share share = Share.of(1, 10, 0.95);

        assertThat(WorthOfACall.table(share, share, 0.002).keySet()).containsExactly("0.001", "0.01", "0.05", "0.002");
        assertThat(WorthOfACall.table(share, share, 0.05).keySet()).containsExactly("0.001", "0.01", "0.05");
        assertThat(WorthOfACall.table(share, share, 0.00001).keySet()).contains("0.00001");
    }

    @ParameterizedTest
    @ValueSource(doubles = {0, 1, -0.5, 1.5, Double.NaN, Double.POSITIVE_INFINITY})
    void levelsAndRatesLieBetweenZeroAndOne(double outside) {
        assertThatThrownBy(() -> new Terms(outside, null))
                .hasMessageContaining("confidence level")
                .hasMessageContaining("" + outside);
        assertThatThrownBy(() -> new Terms(0.9, outside)).hasMessageContaining("defect rate");
        assertThatThrownBy(() -> Share.of(1, 2, outside)).hasMessageContaining("confidence level");
        assertThat(new Terms(0.999, 0.5).defectRate()).isEqualTo(0.5);
    }

    @Test
    void sharesOfTheImpossibleAreRefused() {
        assertThatThrownBy(() -> Share.of(3, 2, 0.95)).hasMessage("A share of 3 out of 2 cannot be");
        assertThatThrownBy(() -> Share.of(-1, 2, 0.95)).isInstanceOf(IllegalArgumentException.class);
        assertThatThrownBy(() -> new Interval(2, 1)).hasMessageContaining("2.0 to 1.0");
        assertThatThrownBy(() -> new Interval(Double.NaN, 1)).isInstanceOf(IllegalArgumentException.class);
    }

    @Test
    void memoAnswersWhatItWasGivenAndForgetsWhatFellIntoTheSameSlot() {
        Memo<String> memo = new Memo<>(1);

        assertThat(memo.find(1, 2, 3, 4, 0.5)).isNull();
        assertThat(memo.keep(1, 2, 3, 4, 0.5, "first")).isEqualTo("first");
        assertThat(memo.find(1, 2, 3, 4, 0.5)).isEqualTo("first");
        assertThat(memo.find(9, 2, 3, 4, 0.5)).isNull();
        assertThat(memo.find(1, 9, 3, 4, 0.5)).isNull();
        assertThat(memo.find(1, 2, 9, 4, 0.5)).isNull();
        assertThat(memo.find(1, 2, 3, 9, 0.5)).isNull();
        assertThat(memo.find(1, 2, 3, 4, 0.6)).isNull();
        memo.keep(9, 2, 3, 4, 0.5, "second");
        assertThat(memo.find(1, 2, 3, 4, 0.5)).isNull();
    }
}
