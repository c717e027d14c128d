package org.levelgaze.plot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatCode;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.levelgaze.plot.MistakePlane.Corner;
import org.levelgaze.plot.MistakePlane.Study;
import org.levelgaze.plot.PieceLadder.Judge;
import org.levelgaze.plot.PieceLadder.Mark;
import org.levelgaze.plot.PieceLadder.Piece;
import org.levelgaze.plot.Trend.Limit;

class ReadingsTest {

    @Test
    void anEstimateLiesInItsInterval() {
        assertThatIllegalArgumentException()
                .isThrownBy(() -> new Estimate(0.5, 0.6, 0.9))
                .withMessage("0.5 is not in 0.6 to 0.9");
        assertThatCode(() -> new Estimate(0.0, 1e-18, 0.2)).doesNotThrowAnyException();
    }

    @Test
    void anEstimateIsFiniteAndWhole() {
        assertThatIllegalArgumentException()
                .isThrownBy(() -> new Estimate(Double.NaN, null, null))
                .withMessageContaining("NaN");
        assertThatIllegalArgumentException().isThrownBy(() -> new Estimate(0.5, 0.1, null));
        assertThatIllegalArgumentException().isThrownBy(() -> new Estimate(null, 0.1, 0.2));
    }

    @Test
    void aShareLiesBetweenNothingAndAll() {
        assertThatIllegalArgumentException()
                .isThrownBy(() -> new Study("S-1", new Estimate(1.01, null, null), Estimate.none()))
                .withMessage("A share lies between 0 and 1, not at 1.01");
        assertThatIllegalArgumentException().isThrownBy(() -> new Corner(0.1, -0.01));
        assertThatCode(() -> new Corner(0, 1)).doesNotThrowAnyException();
    }

    @Test
    void aLimitIsFinite() {
        assertThatIllegalArgumentException()
                .isThrownBy(() -> new Limit("at most", Double.POSITIVE_INFINITY, false))
                .withMessageContaining("Infinity");
    }

    @Test
    void aLimitItselfIsNotBroken() {
        assertThat(new Limit("at least", 0.8, true).isBroken(0.8)).isFalse();
        assertThat(new Limit("at least", 0.8, true).isBroken(0.79)).isTrue();
        assertThat(new Limit("at most", 0.1, false).isBroken(0.1)).isFalse();
        assertThat(new Limit("at most", 0.1, false).isBroken(0.11)).isTrue();
    }

    @Test
    void everyPieceHasAMarkForEveryTrialOfEveryJudge() {
        Piece short1 = new Piece("P-9", true, List.of(List.of(Mark.RIGHT)));
        assertThatIllegalArgumentException()
                .isThrownBy(() -> PieceLadder.of("x", List.of(new Judge("Ana", 2)), List.of(short1), Samples.page("x")))
                .withMessage("Piece P-9 has [1] calls by judge, not [2]");
    }

    @Test
    void anIdFitsHtml() {
        assertThatIllegalArgumentException().isThrownBy(() -> Samples.page("7"));
        assertThatIllegalArgumentException().isThrownBy(() -> Samples.page("a b"));
        assertThatCode(() -> Samples.page("a-1")).doesNotThrowAnyException();
    }

    @Test
    void numbersAreWrittenInTheReadersLanguage() {
        assertThat(Numerals.SHARE.of(0.125, Locale.GERMAN)).isEqualTo("12,5\u00a0%");
        assertThat(Numerals.SHARE.of(0.9, Locale.ENGLISH)).isEqualTo("90\u00a0%");
        assertThat(Numerals.DECIMAL.of(-0.314, Locale.ENGLISH)).isEqualTo("\u22120.31");
        assertThat(Numerals.DECIMAL.of(-0.001, Locale.ENGLISH)).isEqualTo("0.00");
        assertThat(Numerals.DECIMAL.orDash(null, Locale.ENGLISH)).isEqualTo("–");
    }
}
