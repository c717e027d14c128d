package org.levelgaze.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.levelgaze.studies.FindingsJson;

class AssessTest {

    private static final String HEADER = "piece,reference,appraiser,trial,call\n";
    private static final Path STUDY = Path.of("src/test/resources/reference/aiag_msa4_calls.csv");

    @TempDir
    Path folder;

    private record Outcome(int code, String out, String err) {}

    private static Outcome run(Locale locale, String input, String... arguments) {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        ByteArrayOutputStream err = new ByteArrayOutputStream();
        Console console = new Console(
                new ByteArrayInputStream(input.getBytes(StandardCharsets.UTF_8)),
                new PrintStream(out, true, StandardCharsets.UTF_8),
                new PrintStream(err, true, StandardCharsets.UTF_8),
                locale);
        OptionalInt code = Commands.run(console, arguments);
        return new Outcome(code.orElse(-1), out.toString(StandardCharsets.UTF_8), err.toString(StandardCharsets.UTF_8));
    }

    private static Outcome run(String... arguments) {
        return run(Locale.ROOT, "", arguments);
    }

    @Test
    void saysInSentencesFirstWhatTheCallsShow() {
        Outcome outcome = run("assess", STUDY.toString());

        assertThat(outcome.code()).isZero();
        assertThat(outcome.err()).isEmpty();
        assertThat(outcome.out())
                .contains(
                        "Right in every trial on 42 of 50 pieces: 84 %",
                        "Defective pieces let through: 3 of 48 calls.",
                        "Neither way stands out, as far as this shows.",
                        "Is each appraiser right?",
                        "  A           42/50   84 %   71-93 %   94.7 %",
                        "  A - B    44    6    3   97   0.86  0.78..0.95");
        assertThat(outcome.out().indexOf("Right in every trial"))
                .isLessThan(outcome.out().indexOf("0.86"));
    }

    @Test
    void writesTheContractAsJson() {
        Outcome outcome = run("assess", STUDY.toString(), "--format", "json");

        assertThat(outcome.code()).isZero();
        assertThat(FindingsJson.read(outcome.out()).together().allRight().k()).isEqualTo(39);
        assertThat(outcome.out()).doesNotContain("NaN").doesNotContain("Infinity");
    }

    @Test
    void takesAnyLevelInAnyPlace() {
        Outcome outcome = run("assess", "--confidence=0.9", "--format=json", STUDY.toString());

        assertThat(FindingsJson.read(outcome.out()).confidence()).isEqualTo(0.9);
        assertThat(run("assess", STUDY.toString(), "--confidence", "0.999").out())
                .contains("99.9 %");
    }

    @Test
    void readsTheStandardInput() throws IOException {
        Outcome piped = run(Locale.ROOT, Files.readString(STUDY), "assess", "-");

        assertThat(piped).isEqualTo(run("assess", STUDY.toString()));
    }

    @Test
    void namesEveryBadRowAndPrintsNothingElse() {
        Outcome outcome = run(
                Locale.ROOT, HEADER + "1,good,Ana,1,accept\n2,good,Ana,1,maybe\n3,bad,Ana,x,reject\n", "assess", "-");

        assertThat(outcome.code()).isEqualTo(2);
        assertThat(outcome.out()).isEmpty();
        assertThat(outcome.err().lines())
                .containsExactly(
                        "Row 3: call 'maybe' is neither accept nor reject.",
                        "Row 4: reference 'bad' is neither good/accept nor defective/reject.",
                        "Row 4: trial 'x' is not a whole number from 1 to 1000000.",
                        "3 problems. Nothing was computed.");
    }

    @Test
    void needsTheTruths() {
        Outcome outcome = run(Locale.ROOT, "piece,appraiser,trial,call\n1,Ana,1,accept\n", "assess", "-");

        assertThat(outcome.code()).isEqualTo(2);
        assertThat(outcome.out()).isEmpty();
        assertThat(outcome.err()).startsWith("Row 1: column 'reference' is missing or empty.");
    }

    @Test
    void refusesAFileThatIsNone() {
        Outcome outcome = run("assess", folder.resolve("none.csv").toString());

        assertThat(outcome.code()).isEqualTo(2);
        assertThat(outcome.err()).startsWith("There is no file '").contains("none.csv");
        assertThat(run("assess", folder.toString()).code()).isEqualTo(2);
        assertThat(run("assess", folder.toString()).err()).contains("cannot be read");
        assertThat(run("assess", "a\u0000b").code()).isEqualTo(2);
        assertThat(run(Locale.ROOT, "", "assess", "-").err()).isEqualTo("The file is empty.\n");
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "assess",
                "assess a b",
                "assess --color a",
                "assess -x a",
                "assess a --format",
                "assess a --format xml",
                "assess a --confidence 1",
                "assess a --confidence 95",
                "assess a --confidence NaN",
                "assess a --confidence many",
            })
    void explainsItselfWhereItIsNotUnderstood(String line) {
        Outcome outcome = run(line.split(" ", -1));

        assertThat(outcome.code()).isEqualTo(2);
        assertThat(outcome.out()).isEmpty();
        assertThat(outcome.err()).contains("Usage:").contains("--confidence");
        assertThat(outcome.err().lines()).allMatch(text -> text.length() <= Page.WIDTH);
    }

    @Test
    void leavesTheWebApplicationItsOwnArguments() {
        assertThat(run().code()).isEqualTo(-1);
        assertThat(run("--server.port=9000").code()).isEqualTo(-1);
        assertThat(run("assses").code()).isEqualTo(2);
        assertThat(run("assses").err()).startsWith("There is no command 'assses'.");
        assertThat(run("help").out()).contains("assess FILE.csv");
    }

    @ParameterizedTest
    @ValueSource(strings = {"en", "de"})
    void fitsEightyColumnsWhateverTheNames(String language) {
        String longName = "Ö".repeat(200);
        String text = "piece,reference,appraiser,trial,call,defect,seen\n"
                + "1,defective," + longName + ",1,reject,glaze crawl " + longName + ",chip\n"
                + "2,good," + longName + ",1,accept,,\n"
                + "1,defective,Bo,1,accept,,\n2,good,Bo,1,reject,,\n2,good,Bo,2,reject,,\n";

        Outcome outcome = run(Locale.forLanguageTag(language), text, "assess", "-");

        assertThat(outcome.err()).isEmpty();
        assertThat(outcome.out().lines()).allMatch(line -> line.codePointCount(0, line.length()) <= Page.WIDTH);
    }

    @Test
    void speaksGerman() {
        Outcome outcome = run(Locale.GERMANY, HEADER + "1,good,Ana,1,vielleicht\n", "assess", "-");

        assertThat(outcome.err()).startsWith("Zeile 2: call „vielleicht“ ist weder accept noch reject.");
        assertThat(run(Locale.GERMANY, "", "assess", STUDY.toString()).out())
                .contains("Hat jeder Prüfer recht?", "0,86");
    }

    @Test
    void saysWhatSmallAndUnevenSetsCannotShow() {
        Outcome outcome = run(
                Locale.ROOT,
                HEADER + "1,defective,Ana,1,accept\n2,defective,Ana,1,reject\n"
                        + "3,good,Ana,1,accept\n4,good,Ana,1,accept\n5,good,Ana,1,accept\n6,good,Ana,1,accept\n"
                        + "7,good,Ana,1,accept\n8,good,Ana,1,accept\n",
                "assess",
                "-");

        assertThat(outcome.out()).contains("Only 2 of 8 pieces are defective: one of them judged wrong weighs 50 %.");
        assertThat(run(Locale.ROOT, HEADER + "1,good,Ana,1,accept\n", "assess", "-")
                        .out())
                .contains("No piece is defective", "No mistake was made.");
        assertThat(run(Locale.ROOT, HEADER + "1,defective,Ana,1,\n", "assess", "-")
                        .out())
                .contains("No piece is good", "Nothing was judged.", "No piece was judged in every trial");
    }
}
