package org.levelgaze.studies.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.levelgaze.studies.reading.Files.bytes;

import java.io.IOException;
import java.util.List;
import java.util.Objects;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import tools.jackson.databind.json.JsonMapper;

class SketchTest {

    @Test
    void showsTheBeginningOfAFile() throws IOException {
        StringBuilder text = new StringBuilder("piece;note\n");
        for (int row = 1; row <= 40; row++) {
            text.append("P")
                    .append(row)
                    .append(';')
                    .append(row % 2 == 0 ? "even" : "odd")
                    .append('\n');
        }

        Sketch sketch = Sketch.of(bytes(text.toString()));

        assertThat(sketch.delimiter()).isEqualTo(';');
        assertThat(sketch.firstRows()).hasSize(8);
        assertThat(sketch.firstRows().get(0)).containsExactly("P1", "odd");
        assertThat(sketch.columns().get(0).words()).hasSize(12);
        assertThat(sketch.columns().get(0).more()).isTrue();
        assertThat(sketch.columns().get(1)).isEqualTo(new Sketch.Column("note", List.of("odd", "even"), false));
        assertThat(sketch.guess().layout()).isNull();
        assertThat(sketch.guess().complete()).isFalse();
    }

    @ParameterizedTest
    @CsvSource({
        "accept,reject",
        "pass,fail",
        "OK,NOK",
        "good,bad",
        "gut,schlecht",
        "i.O.,n.i.O.",
        "in Ordnung,nicht in Ordnung",
    })
    void guessesTheWordsOfTheTrade(String accept, String reject) throws IOException {
        Sketch sketch = Sketch.of(bytes("Part,Reference,Operator,Trial,Result\n1,good,Ana,1," + accept
                + "\n2,defective,Ana,1," + reject + "\n"));

        assertThat(sketch.guess().complete()).isTrue();
        assertThat(sketch.guess().layout())
                .isEqualTo(new Layout(
                        "Part",
                        "Reference",
                        null,
                        "Operator",
                        "Trial",
                        List.of(new Layout.CallColumn("Result", null, null, null))));
        assertThat(sketch.guess().words().accept()).containsExactly(Words.plain(accept));
        assertThat(sketch.guess().words().reject()).containsExactly(Words.plain(reject));
        assertThat(sketch.guess().words().good()).containsExactly("good");
        assertThat(sketch.guess().words().defective()).containsExactly("defective");
    }

    @Test
    void neverGuessesOneAndZero() throws IOException {
        Guess guess = Sketch.of(bytes("piece,reference,appraiser,trial,call\n1,1,Ana,1,1\n2,0,Ana,1,0\n3,1,Ana,1,ok\n"))
                .guess();

        assertThat(guess.layout()).isNotNull();
        assertThat(guess.openCalls()).containsExactly("1", "0");
        assertThat(guess.openTruths()).containsExactly("1", "0");
        assertThat(guess.words().accept()).containsExactly("ok");
        assertThat(guess.words().good()).isEmpty();
        assertThat(guess.complete()).isFalse();
    }

    @Test
    void guessesAWideFile() throws IOException {
        Guess guess = Sketch.of(bytes(
                        "Teil;Soll;Ana 1;Ana D2;Jörg_1;Bemerkung\nT1;gut;gut;schlecht;gut;x\nT2;schlecht;gut;;gut;y\n"))
                .guess();

        assertThat(Objects.requireNonNull(guess.layout()).calls())
                .containsExactly(
                        new Layout.CallColumn("Ana 1", "Ana", 1, null),
                        new Layout.CallColumn("Ana D2", "Ana", 2, null),
                        new Layout.CallColumn("Jörg_1", "Jörg", 1, null));
        assertThat(guess.layout().reference()).isEqualTo("Soll");
        assertThat(guess.complete()).isTrue();
    }

    @Test
    void guessesOneColumnPerTrialBesideAnAppraiser() throws IOException {
        Guess guess = Sketch.of(bytes("piece,reference,appraiser,trial 1,trial 2\n1,good,Ana,pass,fail\n"))
                .guess();

        assertThat(Objects.requireNonNull(guess.layout()).calls())
                .containsExactly(
                        new Layout.CallColumn("trial 1", null, 1, null),
                        new Layout.CallColumn("trial 2", null, 2, null));
    }

    @Test
    void aFileWithoutTrialsHasOne() throws IOException {
        Guess guess = Sketch.of(bytes("piece,truth,camera,call\n1,good,RIM-CAM,pass\n"))
                .guess();

        assertThat(Objects.requireNonNull(guess.layout()).calls())
                .containsExactly(new Layout.CallColumn("call", null, 1, null));
    }

    @Test
    void doesNotGuessWhereTwoColumnsWouldBeTheSame() throws IOException {
        assertThat(Sketch.of(bytes("piece,Ana 1,Ana-1\n1,ok,ok\n")).guess().layout())
                .isNull();
        assertThat(Sketch.of(bytes("piece,Ana,Ana\n1,ok,ok\n")).guess().layout())
                .isNull();
        assertThat(Sketch.of(bytes("piece,call\n1,ok\n")).guess().layout()).isNull();
        assertThat(Sketch.of(bytes("piece,note\n1,blue\n")).guess().layout()).isNull();
    }

    @Test
    void whatWasAgreedUponSurvivesAsJson() throws IOException {
        Guess guess = Sketch.of(bytes("Teil;Soll;Ana 1\nT1;gut;n.i.O.\n")).guess();
        JsonMapper json = JsonMapper.builder().build();

        assertThat(json.readValue(json.writeValueAsString(guess.layout()), Layout.class))
                .isEqualTo(guess.layout());
        assertThat(json.readValue(json.writeValueAsString(guess.words()), Words.class))
                .isEqualTo(guess.words());
    }
}
