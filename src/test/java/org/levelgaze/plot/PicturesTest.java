package org.levelgaze.plot;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.levelgaze.plot.MistakePlane.Study;
import org.levelgaze.plot.PieceLadder.Judge;
import org.levelgaze.plot.PieceLadder.Mark;
import org.levelgaze.plot.PieceLadder.Piece;
import org.levelgaze.plot.Trend.Figure;
import org.levelgaze.plot.Trend.Point;
import org.w3c.dom.Document;
import org.w3c.dom.Element;

class PicturesTest {

    private static final Pattern CLASS = Pattern.compile("plot-(fill|line)-[a-z-]+");
    private static final Pattern ID = Pattern.compile(" id=\"([^\"]+)\"");

    @Test
    void everyPictureIsWellFormedAndHasATitleAndNumbersInWords() {
        for (Picture picture : Samples.all(Samples.page("x"))) {
            Document document = SvgReading.parse(picture.svg());
            Element root = document.getDocumentElement();
            assertThat(root.getAttribute("role")).isIn("img", "group");
            assertThat(root.getAttribute("alt")).isEmpty();
            for (String id : root.getAttribute("aria-labelledby").split(" ", -1)) {
                assertThat(picture.svg()).contains("id=\"" + id + "\"");
            }
            assertThat(SvgReading.elements(document, "desc").get(0).getTextContent())
                    .isNotBlank();
            assertThat(picture.svg()).doesNotContain("style=");
            assertThat(picture.tableRows()).isNotEmpty();
        }
    }

    @Test
    void idsOfTwoPicturesOnOnePageDiffer() {
        List<String> ids = Samples.all(Samples.page("x")).stream()
                .flatMap(picture -> ID.matcher(picture.svg()).results())
                .map(found -> found.group(1))
                .toList();
        assertThat(ids).isNotEmpty().doesNotHaveDuplicates();
    }

    @Test
    void onPaperAPictureIsOneImageWithAnAlternative() {
        for (Picture picture : Samples.all(Samples.paper("x"))) {
            Element root = SvgReading.parse(picture.svg()).getDocumentElement();
            assertThat(root.getAttribute("role")).isEqualTo("img");
            assertThat(root.getAttribute("alt")).isNotBlank();
            assertThat(picture.svg()).doesNotContain("tabindex");
        }
    }

    @Test
    void everyLanguageHasEveryWord() {
        assertThat(Samples.all(Samples.german("x"))).hasSameSizeAs(Samples.all(Samples.page("x")));
        assertThat(trendOf(Samples.effectiveness(), Samples.german("x")).svg()).contains("Unter at least 80\u00a0%.");
    }

    @ParameterizedTest
    @ValueSource(strings = {"lean-row", "lean-form", "plane", "trend", "ladder"})
    void looksAsItDid(String name) throws IOException {
        Picture picture = golden(name);
        assertThat(picture.svg().replace("><", ">\n<") + "\n").isEqualTo(text(name + ".svg"));
    }

    static Picture golden(String name) {
        List<Picture> all = Samples.all(Samples.page("golden"));
        return switch (name) {
            case "lean-row" -> all.get(0);
            case "lean-form" -> all.get(4);
            case "plane" -> all.get(5);
            case "trend" -> all.get(6);
            default ->
                PieceLadder.of(
                        "Glaze", Samples.judges(), Samples.pieces(4, Samples.judges(), 7), Samples.page("golden-l"));
        };
    }

    @Test
    void leaningIsSaidOnlyWhereTheIntervalExcludesEven() {
        Drawing drawing = Samples.page("x");
        assertThat(LeanScale.row("A", new Estimate(0.3, 0.0, 0.6), List.of(), drawing)
                        .tableRows()
                        .get(0))
                .containsExactly("0.30", "0.00", "0.60", "even, as far as this shows");
        assertThat(LeanScale.row("A", new Estimate(0.3, 0.01, 0.6), List.of(), drawing)
                        .tableRows()
                        .get(0))
                .endsWith("lenient");
        assertThat(LeanScale.row("A", new Estimate(-0.3, -0.6, -0.01), List.of(), drawing)
                        .tableRows()
                        .get(0))
                .endsWith("strict");
    }

    @Test
    void lenientLiesRightOfStrict() {
        double lenient = markAt(new Estimate(0.5, null, null));
        double strict = markAt(new Estimate(-0.5, null, null));
        assertThat(lenient).isGreaterThan(90);
        assertThat(strict).isLessThan(90);
        assertThat(lenient + strict).isEqualTo(180);
    }

    private static double markAt(Estimate c) {
        Document document = SvgReading.parse(
                LeanScale.row("A", c, List.of(), Samples.page("x")).svg());
        return Double.parseDouble(SvgReading.elements(document, "circle").get(0).getAttribute("cx"));
    }

    @Test
    void driftTowardLeniencyClimbs() {
        Document document = SvgReading.parse(
                MistakePlane.of("x", Samples.studies(), null, Samples.page("x")).svg());
        List<Double> heights = SvgReading.elements(document, "circle").stream()
                .map(dot -> Double.parseDouble(dot.getAttribute("cy")))
                .toList();
        assertThat(heights).hasSize(4).isSortedAccordingTo(Collections.reverseOrder());
    }

    @Test
    void aPointBeyondALimitHasAnotherShape() {
        Picture picture = trendOf(Samples.effectiveness(), Samples.page("x"));
        Document document = SvgReading.parse(picture.svg());
        assertThat(SvgReading.elements(document, "circle")).hasSize(3);
        assertThat(picture.svg()).contains("76\u00a0% (65\u00a0% to 87\u00a0%). Below at least 80\u00a0%.");
        assertThat(picture.tableRows().get(3)).endsWith("Below at least 80\u00a0%.");
    }

    @Test
    void aTrendStandsInTheOrderOfDays() {
        List<Point> reversed = new ArrayList<>(Samples.effectiveness());
        Collections.reverse(reversed);
        assertThat(trendOf(reversed, Samples.page("x"))).isEqualTo(trendOf(Samples.effectiveness(), Samples.page("x")));
    }

    @Test
    void thePieceMiscalledMostStandsFirst() {
        List<Judge> judges = List.of(new Judge("Ana", 2));
        List<Piece> pieces = List.of(
                new Piece("A", true, List.of(List.of(Mark.RIGHT, Mark.RIGHT))),
                new Piece("B", true, List.of(List.of(Mark.FALSE_ACCEPT, Mark.RIGHT))),
                new Piece("C", false, List.of(List.of(Mark.FALSE_REJECT, Mark.FALSE_REJECT))),
                new Piece("D", false, List.of(List.of(Mark.NOT_JUDGED, Mark.NOT_JUDGED))));
        Picture picture = PieceLadder.of("x", judges, pieces, Samples.page("x"));
        assertThat(picture.tableRows())
                .containsExactly(
                        List.of("C", "good", "2 of 2", "2 of 2"),
                        List.of("B", "defective", "1 of 2", "1 of 2"),
                        List.of("A", "defective", "0 of 2", "0 of 2"),
                        List.of("D", "good", "0 of 0", "–"));
        assertThat(picture.svg()).contains("2 of 4 pieces were miscalled at least once");
    }

    @Test
    void aLargeStudyShowsItsMiscalledPiecesAndCountsTheRest() {
        List<Judge> judges = Samples.judges();
        List<Piece> pieces = Samples.pieces(400, judges, 11);
        long wrong = pieces.stream().filter(piece -> piece.wrong() > 0).count();
        Picture picture = PieceLadder.of("x", judges, pieces, Samples.page("x"));
        assertThat(picture.tableRows()).hasSize(PieceLadder.MOST_PIECES);
        assertThat(picture.svg())
                .contains((wrong - 60) + " more pieces were miscalled", (400 - wrong) + " pieces were called right");
    }

    @Test
    void labelsOfStrangersStayText() {
        String label = "<script>alert(1)</script> & \"x\"";
        Drawing drawing = Samples.page("x");
        List<Judge> judges = List.of(new Judge(label, 1));
        Stream.of(
                        LeanScale.form(label, Estimate.none(), List.of(), drawing),
                        MistakePlane.of(label, List.of(study(label)), null, drawing),
                        Trend.of(label, Figure.SHARE, label, List.of(point(label)), List.of(), drawing),
                        PieceLadder.of(
                                label,
                                judges,
                                List.of(new Piece(label, true, List.of(List.of(Mark.FALSE_ACCEPT)))),
                                drawing))
                .forEach(picture -> {
                    Document document = SvgReading.parse(picture.svg());
                    assertThat(SvgReading.elements(document, "script")).isEmpty();
                    assertThat(document.getDocumentElement().getTextContent()).contains(label);
                });
    }

    private static Study study(String name) {
        return new Study(name, Samples.share(0.1, 0.1), Samples.share(0.1, 0.1));
    }

    private static Point point(String name) {
        return Samples.point(LocalDate.of(2026, 1, 2), name, Samples.share(0.9, 0.1));
    }

    @Test
    void everyColourOfAPictureHasItsRuleInTheStyleSheet() throws IOException {
        String css = text("/static/css/plot.css");
        List<String> classes = Samples.all(Samples.page("x")).stream()
                .flatMap(picture -> CLASS.matcher(picture.svg()).results())
                .map(found -> found.group())
                .distinct()
                .toList();
        assertThat(classes)
                .hasSizeGreaterThan(12)
                .allSatisfy(name -> assertThat(css).contains("." + name + " {"));
    }

    @Test
    void paperHasTheColoursOfTheLightPage() throws IOException {
        String css = text("/static/css/levelgaze.css");
        String light = css.substring(css.indexOf(":root {"), css.indexOf('}', css.indexOf(":root {")));
        for (Tone tone : Tone.values()) {
            assertThat(light).contains("--" + tone.token() + ": " + tone.paper() + ";");
        }
    }

    private static String text(String resource) throws IOException {
        try (var stored = Objects.requireNonNull(PicturesTest.class.getResourceAsStream(resource), resource)) {
            return new String(stored.readAllBytes(), StandardCharsets.UTF_8);
        }
    }

    private static Picture trendOf(List<Point> points, Drawing drawing) {
        return Trend.of("x", Figure.SHARE, "Effectiveness", points, List.of(Samples.AT_LEAST), drawing);
    }

    @Test
    void coordinatesDoNotFollowTheLanguage() {
        Locale before = Locale.getDefault();
        try {
            Locale.setDefault(Locale.forLanguageTag("ar-EG-u-nu-arab"));
            String svg = LeanScale.row("x", new Estimate(0.5, 0.1, 0.9), List.of(), Samples.page("x"))
                    .svg();
            assertThat(svg).contains("viewBox=\"0 0 180 28\"").doesNotContainPattern("[\u0660-\u0669]");
        } finally {
            Locale.setDefault(before);
        }
    }
}
