package org.levelgaze.plot;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.assertThatIllegalStateException;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class SvgWriterTest {

    @ParameterizedTest
    @CsvSource({"0, 0", "-0.001, 0", "12, 12", "100, 100", "0.125, 0.13", "-3.5, -3.5", "1234567.891, 1234567.89"})
    void writesNumbersWithAPointAndAtMostTwoDecimals(double value, String written) {
        assertThat(SvgWriter.number(value)).isEqualTo(written);
    }

    @ParameterizedTest
    @ValueSource(doubles = {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY})
    void hasNoPlaceForWhatIsNotFinite(double value) {
        assertThatIllegalArgumentException()
                .isThrownBy(() -> SvgWriter.number(value))
                .withMessageContaining(Double.toString(value));
    }

    @Test
    void escapesWhatXmlReadsAsMarkup() {
        assertThat(SvgWriter.escaped("a < b & \"c\" > 'd'")).isEqualTo("a &lt; b &amp; &quot;c&quot; &gt; 'd'");
    }

    @Test
    void replacesCharactersThatXmlHasNoPlaceFor() {
        assertThat(SvgWriter.escaped("a\u0000b\u001bc\ud800d\ufffee")).isEqualTo("a\ufffdb\ufffdc\ufffdd\ufffde");
    }

    @Test
    void keepsCharactersBeyondTheFirstPlane() {
        assertThat(SvgWriter.escaped("\ud83c\udffa")).isEqualTo("\ud83c\udffa");
    }

    @Test
    void refusesToEndWithAnOpenElement() {
        SvgWriter svg = new SvgWriter().open("svg");
        assertThatIllegalStateException().isThrownBy(svg::toString).withMessageContaining("svg");
    }
}
