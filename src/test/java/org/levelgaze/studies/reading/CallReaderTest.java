package org.levelgaze.studies.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.levelgaze.studies.reading.Files.HEADER;
import static org.levelgaze.studies.reading.Files.bytes;
import static org.levelgaze.studies.reading.Files.calls;
import static org.levelgaze.studies.reading.Files.complaints;
import static org.levelgaze.studies.reading.Files.read;
import static org.levelgaze.studies.reading.Files.rows;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HexFormat;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.concurrent.CancellationException;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.levelgaze.agreement.Engine;
import org.levelgaze.agreement.Piece;
import org.levelgaze.agreement.Study;
import org.levelgaze.agreement.Terms;
import org.levelgaze.agreement.TrueState;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.RowError;

class CallReaderTest {

    private static final String TWO = HEADER + "1,good,Ana,1,accept\n2,defective,Ana,1,reject\n";

    @ParameterizedTest
    @ValueSource(strings = {",", ";", "\t"})
    void findsTheDelimiter(String delimiter) {
        assertThat(rows(calls(TWO.replace(",", delimiter)))).containsExactly("1 Ana 1 ACCEPT", "2 Ana 1 REJECT");
    }

    @ParameterizedTest
    @ValueSource(strings = {"\n", "\r\n", "\r"})
    void takesAnyLineEnd(String end) {
        assertThat(rows(calls(TWO.replace("\n", end)))).containsExactly("1 Ana 1 ACCEPT", "2 Ana 1 REJECT");
    }

    @Test
    void takesAByteOrderMarkQuotesAndAMissingLastLineEnd() {
        String text = "\uFEFF\"piece\",reference,appraiser,trial,call\n\"a, \"\"b\"\"\",good,\"Ana\",1,accept";

        assertThat(rows(calls(text))).containsExactly("a, \"b\" Ana 1 ACCEPT");
    }

    @Test
    void keepsNamesExactlyAsWritten() {
        RecordedCalls calls = calls(HEADER + " Schüssel №1 ,GOOD,Zoë, 1 , Accept \n");

        assertThat(rows(calls)).containsExactly(" Schüssel №1  Zoë 1 ACCEPT");
    }

    @Test
    void findsColumnsInAnyOrderAndIgnoresOthers() {
        assertThat(rows(calls("Call,note,Trial,Appraiser,Reference,Piece\nreject,x,1,Ana,good,7\n")))
                .containsExactly("7 Ana 1 REJECT");
    }

    @Test
    void emptyCallsAndAbsentRowsAreTheSame() {
        RecordedCalls calls = calls(TWO + "3,good,Bo,1,\n,,,,\n\n1,good,Ana,1,\n");

        assertThat(rows(calls)).hasSize(2);
        assertThat(calls.pieces()).extracting(RecordedPiece::label).containsExactly("1", "2", "3");
        assertThat(calls.appraisers()).containsExactly("Ana", "Bo");
        assertThat(calls.emptyCalls()).isEqualTo(2);
        assertThat(calls.rows()).isEqualTo(4);
    }

    @Test
    void addingARowWithAnEmptyCallChangesNoFinding() {
        Study plain = calls(TWO).toStudy();
        Study more = calls(TWO + "1,good,Ana,9,\n2,,Ana,1,\n").toStudy();

        assertThat(Engine.assess(more, Terms.STANDARD)).isEqualTo(Engine.assess(plain, Terms.STANDARD));
    }

    @Test
    void namesEveryBadRowInOneGo() {
        String text = HEADER
                + "1,good,Ana,1,accept\n"
                + "2,perhaps,Ana,1,maybe\n"
                + ",good,,0,accept\n"
                + "1,good,Ana,1,reject\n"
                + "1,defective,Ana,2,accept\n"
                + "3,good,Ana,1.5,accept\n"
                + "3,good,Ana\n";

        assertThat(complaints(text))
                .containsExactly(
                        "Row 3: reference 'perhaps' is neither good/accept nor defective/reject.",
                        "Row 3: call 'maybe' is neither accept nor reject.",
                        "Row 4: piece is empty.",
                        "Row 4: appraiser is empty.",
                        "Row 4: trial '0' is not a whole number from 1 to 1000000.",
                        "Row 5: piece '1', appraiser 'Ana', trial 1 is called in row 2 already.",
                        "Row 6: reference of piece '1' is 'defective' here and 'good' in row 2.",
                        "Row 7: trial '1.5' is not a whole number from 1 to 1000000.",
                        "Row 8: it has 3 cells, the header has 5.");
    }

    @Test
    void countsRowsAsLinesOfTheFile() {
        String text = HEADER + "\n1,good,Ana,1,accept\n\n\"2\n2\",good,Ana,1,accept\n3,good,Ana,1,maybe\n";

        assertThat(complaints(text))
                .containsExactly(
                        "Row 5: piece '2\\u000A2' holds a control character. Take it out.",
                        "Row 7: call 'maybe' is neither accept nor reject.");
    }

    @Test
    void aRepeatIsRefusedEvenWhenEqual() {
        assertThat(complaints(TWO + "1,good,Ana,1,accept\n"))
                .containsExactly("Row 4: piece '1', appraiser 'Ana', trial 1 is called in row 2 already.");
    }

    @Test
    void refusesAGapInTheTrialNumbers() {
        assertThat(complaints(TWO + "1,good,Ana,3,accept\n1,good,Ana,7,accept\n"))
                .containsExactly(
                        "Row 4: trial is 3, but nobody has a trial 2.", "Row 5: trial is 7, but nobody has a trial 4.");
        assertThat(calls(TWO + "1,good,Bo,2,\n1,good,Ana,3,accept\n").trials()).isEqualTo(3);
        assertThat(calls(TWO + "1,good,Bo,9,\n").trials()).isEqualTo(1);
    }

    @Test
    void refusesControlCharacters() {
        assertThat(complaints(HEADER + "1\u0000,good,Ana,1,accept\n2,good,A\u0085na,1,accept\n"))
                .containsExactly(
                        "Row 2: piece '1\\u0000' holds a control character. Take it out.",
                        "Row 3: appraiser 'A\\u0085na' holds a control character. Take it out.");
    }

    @Test
    void aPieceWithoutATruthIsNamedWhereOthersHaveOne() {
        assertThat(complaints(HEADER + "1,good,Ana,1,accept\n2,,Ana,1,accept\n"))
                .containsExactly(
                        "Row 3: reference of piece '2' is empty in every row, while other pieces have theirs.");
        assertThat(calls(HEADER + "1,good,Ana,1,accept\n1,,Bo,1,accept\n").hasTruths())
                .isTrue();
    }

    @Test
    void aGreyPieceIsTakenAndNotScored() {
        RecordedCalls calls = calls(HEADER + "1,grey,Ana,1,accept\n2,good,Ana,1,reject\n1,Grey,Ana,2,reject\n");

        assertThat(calls.hasTruths()).isTrue();
        assertThat(calls.pieces()).extracting(RecordedPiece::isGrey).containsExactly(true, false);
        assertThat(calls.calls()).isEqualTo(3);
        assertThat(calls.toStudy().pieces()).extracting(Piece::label).containsExactly("2");
        assertThat(complaints(HEADER + "1,grey,Ana,1,accept\n1,good,Ana,2,accept\n"))
                .containsExactly("Row 3: reference of piece '1' is 'good' here and 'grey' in row 2.");
    }

    @Test
    void theReferenceMayBeLeftOut() {
        RecordedCalls without = calls("piece,appraiser,trial,call\n1,Ana,1,accept\n2,Ana,1,reject\n3,Ana,1,reject\n");

        assertThat(without.hasTruths()).isFalse();
        assertThat(calls(HEADER + "1,,Ana,1,accept\n").hasTruths()).isFalse();
        assertThatThrownBy(without::toStudy).isInstanceOf(IllegalStateException.class);
        Study study =
                without.toStudy(label -> label.equals("2") ? null : new Piece(label, TrueState.DEFECTIVE, "chip"));
        assertThat(study.pieces()).extracting(Piece::label).containsExactly("1", "3");
        assertThat(study.calls()).isEqualTo(2);
        assertThat(study.kinds()).containsExactly("chip");
    }

    @Test
    void readsTrueAndSeenDefectKinds() {
        String text = """
                piece,reference,appraiser,trial,call,defect,seen
                1,defective,Ana,1,reject,chip,crack
                1,defective,Bo,1,reject,chip,chip
                2,good,Bo,1,accept,,
                """;
        RecordedCalls calls = calls(text);

        assertThat(rows(calls)).containsExactly("1 Ana 1 REJECT crack", "1 Bo 1 REJECT chip", "2 Bo 1 ACCEPT");
        assertThat(calls.pieces().get(0).defectKind()).isEqualTo("chip");
        assertThat(complaints(text + "1,defective,Cy,1,reject,stain,chip\n"))
                .containsExactly("Row 5: defect of piece '1' is 'stain' here and 'chip' in row 2.");
    }

    @Test
    void namesMissingAndRepeatedColumns() {
        assertThat(complaints("piece,reference,who,call,call\n"))
                .containsExactly(
                        "Row 1: column 'appraiser' is missing. The columns are: piece, reference, who, call, call.",
                        "Row 1: column 'trial' is missing. The columns are: piece, reference, who, call, call.",
                        "Row 1: column 'call' stands twice. Give one of the two another name.");
    }

    @Test
    void listsTheFirstTwoHundredCountsAllAndHandsOnEach() throws IOException {
        StringBuilder text = new StringBuilder(HEADER);
        for (int piece = 0; piece < 500; piece++) {
            text.append(piece).append(",good,Ana,1,maybe\n");
        }
        List<RowError> all = new ArrayList<>();

        Reading reading = CallReader.standard().read(bytes(text.toString()), Watcher.NONE, all::add);

        Reading.Refused refused = (Reading.Refused) reading;
        assertThat(refused.first()).hasSize(200);
        assertThat(refused.inAll()).isEqualTo(500);
        assertThat(all).hasSize(500);
        assertThat(all.get(499).row()).isEqualTo(501);
        assertThat(all.get(499).column()).isEqualTo("call");
        assertThat(all.get(499).value()).isEqualTo("maybe");
    }

    @Test
    void shortensLongValuesInItsComplaints() {
        assertThat(complaints(HEADER + "x".repeat(1_001) + ",good,Ana,1,accept\n"))
                .containsExactly("Row 2: piece '" + "x".repeat(80) + "…' is longer than 1000 characters.");
    }

    @Test
    void aQuoteLeftOpenEndsTheReading() {
        assertThat(complaints(TWO + "3,good,Ana,1,maybe\n4,good,\"Ana,1,accept\n5,good,Ana,1,accept\n"))
                .containsExactly(
                        "Row 4: call 'maybe' is neither accept nor reject.",
                        "Row 5: a quote is opened and not closed, or text follows a closing quote. The rows below it"
                                + " cannot be told apart.");
        assertThat(complaints(TWO + "3,good,\"Ana\"x,1,accept\n"))
                .hasSize(1)
                .allMatch(text -> text.startsWith("Row 4:"));
    }

    @Test
    void refusesOtherEncodingsByName() {
        String text = TWO + "3,good,Jürgen,1,accept\n";

        assertThat(refusal(text.getBytes(Charset.forName("windows-1252"))))
                .isEqualTo("Row 4: the file is not UTF-8, it looks like windows-1252. Save it as \"CSV UTF-8\" and try"
                        + " again.");
        assertThat(refusal(text.getBytes(StandardCharsets.UTF_16))).contains("UTF-16");
        assertThat(refusal(text.getBytes(StandardCharsets.UTF_16LE))).contains("UTF-16");
        assertThat(refusal(text.getBytes(StandardCharsets.UTF_16BE))).contains("UTF-16");
        assertThat(refusal(new byte[] {'a', ',', (byte) 0xC3})).contains("windows-1252");
    }

    @Test
    void takesCharactersThatLieAcrossBlocks() {
        StringBuilder text = new StringBuilder(HEADER);
        for (int piece = 0; piece < 20_000; piece++) {
            text.append("x".repeat(piece % 3))
                    .append("Schüssel€𝄞")
                    .append(piece)
                    .append(",good,Ana,1,accept\n");
        }

        RecordedCalls calls = calls(text.toString());

        assertThat(calls.calls()).isEqualTo(20_000);
        assertThat(calls.pieces()).allMatch(piece -> piece.label().contains("Schüssel€𝄞"));
    }

    @Test
    void refusesPackedFilesByName() {
        assertThat(refusal(new byte[] {0x1F, (byte) 0x8B, 8, 0}))
                .contains("gzip")
                .contains("Unpack it");
        assertThat(refusal(new byte[] {'P', 'K', 3, 4, 0})).contains("zip, xlsx");
        assertThat(refusal(new byte[] {(byte) 0xD0, (byte) 0xCF, 0x11, (byte) 0xE0}))
                .contains("xls");
        assertThat(refusal("%PDF-1.7".getBytes(StandardCharsets.US_ASCII))).contains("PDF");
    }

    @Test
    void refusesFilesWithNothingInThem() {
        assertThat(refusal(new byte[0])).isEqualTo("The file is empty.");
        assertThat(refusal("\n\n".getBytes(StandardCharsets.UTF_8))).startsWith("Row 1 is empty.");
        assertThat(refusal(HEADER.getBytes(StandardCharsets.UTF_8))).contains("no row of calls");
        assertThat(refusal("\"piece,".getBytes(StandardCharsets.UTF_8))).startsWith("Row 1: a quote");
    }

    @Test
    void refusesTooManyAppraisersAndTooManyColumns() {
        StringBuilder text = new StringBuilder(HEADER);
        for (int at = 0; at <= Limits.APPRAISERS; at++) {
            text.append("1,good,A").append(at).append(",1,accept\n");
        }

        assertThat(refusal(text.toString().getBytes(StandardCharsets.UTF_8))).contains("more than 500 appraisers");
        assertThat(refusal((",".repeat(Limits.COLUMNS) + "piece").getBytes(StandardCharsets.UTF_8)))
                .contains("more than 1000 columns");
    }

    @Test
    void stopsARowThatNeverEnds() throws IOException {
        InputStream endless = new Endless((HEADER + "\"").getBytes(StandardCharsets.UTF_8));

        assertThatThrownBy(() -> CallReader.standard().read(endless))
                .isInstanceOfSatisfying(
                        Refusal.class, refusal -> assertThat(refusal.type()).isEqualTo("file-row-too-long"));
    }

    @Test
    void stopsAFileThatIsTooLarge() {
        InputStream endless = new FileBytes(new Endless(HEADER.getBytes(StandardCharsets.UTF_8)), 1_000_000);

        assertThatThrownBy(() -> endless.transferTo(OutputStream.nullOutputStream()))
                .isInstanceOfSatisfying(Refusal.class, refusal -> {
                    assertThat(refusal.type()).isEqualTo("file-too-large");
                    assertThat(refusal.kind()).isEqualTo(Refusal.Kind.TOO_LARGE);
                });
    }

    @Test
    void tellsHowFarItIsAndStopsWhenAsked() throws IOException {
        StringBuilder text = new StringBuilder(HEADER);
        for (int piece = 0; piece < 5_000; piece++) {
            text.append(piece).append(",good,Ana,1,accept\n");
        }
        List<Long> rows = new ArrayList<>();

        CallReader.standard().read(bytes(text.toString()), (done, bytes) -> rows.add(done), error -> {});

        assertThat(rows).containsExactly(2_000L, 4_000L, 5_000L);
        assertThatThrownBy(() ->
                        CallReader.standard().read(bytes(text.toString()), (done, bytes) -> done < 4_000, error -> {}))
                .isInstanceOf(CancellationException.class)
                .hasMessage("stopped after 4000 rows");
    }

    @Test
    void digestsTheBytesOfTheFile() throws Exception {
        byte[] bytes = ("\uFEFF" + TWO).getBytes(StandardCharsets.UTF_8);
        RecordedCalls calls = ((Reading.Read) CallReader.standard().read(new ByteArrayInputStream(bytes))).calls();

        assertThat(calls.bytes()).isEqualTo(bytes.length);
        assertThat(calls.sha256())
                .isEqualTo(HexFormat.of()
                        .formatHex(MessageDigest.getInstance("SHA-256").digest(bytes)));
    }

    @Test
    void readsWideFilesWithOneColumnPerAppraiserAndTrial() {
        Layout layout = new Layout(
                "Teil",
                "Soll",
                null,
                null,
                null,
                List.of(
                        new Layout.CallColumn("Ana 1", "Ana", 1, null),
                        new Layout.CallColumn("Ana 2", "Ana", 2, null),
                        new Layout.CallColumn("Bo", "Bo", 1, null)));
        Words words = new Words(
                new LinkedHashSet<>(List.of("i.O.", "gut")), Set.of("n.i.O."), Set.of("gut"), Set.of("schlecht"));

        RecordedCalls calls = ((Reading.Read) read(
                        new CallReader(layout, words),
                        bytes("Teil;Soll;Ana 1;Ana 2;Bo\nT1;gut;i.O.;N.I.O.;\nT2;schlecht;n.i.o.;n.i.O.;gut\n")))
                .calls();

        assertThat(rows(calls))
                .containsExactly(
                        "T1 Ana 1 ACCEPT", "T1 Ana 2 REJECT", "T2 Ana 1 REJECT", "T2 Ana 2 REJECT", "T2 Bo 1 ACCEPT");
        assertThat(calls.emptyCalls()).isEqualTo(1);
        assertThat(complaints(read(
                        new CallReader(layout, words),
                        bytes("Teil;Soll;Ana 1;Ana 2;Bo\nT1;gut;i.O.;1;gut\nT1;gut;;;gut\n"))))
                .containsExactly(
                        "Row 2: Ana 2 '1' is neither i.o./gut nor n.i.o..",
                        "Row 3: piece 'T1', appraiser 'Bo', trial 1 is called in row 2 already.");
    }

    @Test
    void layoutsSayEachThingOnce() {
        Layout.CallColumn call = new Layout.CallColumn("call", null, null, null);

        assertThatThrownBy(() -> new Layout("p", null, null, "a", "t", List.of()))
                .hasMessageContaining("a column of calls");
        assertThatThrownBy(() -> new Layout("p", null, null, null, "t", List.of(call)))
                .hasMessageContaining("one source of its appraiser");
        assertThatThrownBy(() -> new Layout("p", null, null, "a", null, List.of(call)))
                .hasMessageContaining("one source of its trial");
        assertThatThrownBy(() -> new Layout("p", null, null, "a", "t", List.of(call, call)))
                .hasMessageContaining("same appraiser and trial");
        assertThatThrownBy(() -> new Layout.CallColumn("c", " ", 1, null)).hasMessageContaining("no name");
        assertThatThrownBy(() -> new Layout.CallColumn("c", "Ana", 0, null)).hasMessageContaining("not 0");
        assertThatThrownBy(() -> new Words(Set.of("OK"), Set.of("ok "), Set.of(), Set.of()))
                .hasMessageContaining("'ok' cannot mean both");
    }

    private static String refusal(byte[] bytes) {
        try {
            read(CallReader.standard(), new ByteArrayInputStream(bytes));
        } catch (Refusal refusal) {
            return Files.sentence(refusal);
        }
        throw new AssertionError("The file was taken");
    }

    /** A beginning, and then the letter x for ever. */
    private static final class Endless extends InputStream {

        private final InputStream beginning;

        Endless(byte[] beginning) {
            this.beginning = new ByteArrayInputStream(beginning);
        }

        @Override
        public int read() throws IOException {
            int next = beginning.read();
            return next < 0 ? 'x' : next;
        }

        @Override
        public int read(byte[] into, int offset, int length) throws IOException {
            int got = beginning.read(into, offset, length);
            if (got < 0) {
                Arrays.fill(into, offset, offset + length, (byte) 'x');
                return length;
            }
            return got;
        }
    }
}
