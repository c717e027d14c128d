package org.levelgaze.plot;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.regex.Pattern;
import java.util.stream.IntStream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.levelgaze.plot.MistakePlane.Corner;
import org.levelgaze.plot.MistakePlane.Study;
import org.levelgaze.plot.PieceLadder.Judge;
import org.levelgaze.plot.Trend.Figure;
import org.levelgaze.plot.Trend.Limit;
import org.levelgaze.plot.Trend.Point;
import org.w3c.dom.Document;
import org.w3c.dom.Element;

/** Over seeded random readings every picture stays inside of its frame; the seed is the test's argument. */
class PicturesOfAnythingTest {

    private static final Pattern NUMBER = Pattern.compile("-?\\d+(\\.\\d+)?");
    private static final List<String> ACROSS = List.of("x", "x1", "x2", "cx");
    private static final List<String> DOWN = List.of("y", "y1", "y2", "cy");
    private static final String LONG_LABEL = "مفتش الجودة في الوردية الليلية ".repeat(4);

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12})
    void staysInsideOfItsFrame(long seed) {
        SplittableRandom random = new SplittableRandom(seed);
        for (int i = 0; i < 10; i++) {
            int points = random.nextInt(8) == 0 ? 500 : random.nextInt(6);
            checkInside(LeanScale.row(LONG_LABEL, lean(random), limits(random), Samples.page("x")));
            checkInside(LeanScale.form(LONG_LABEL, lean(random), limits(random), Samples.german("x")));
            checkInside(MistakePlane.of(LONG_LABEL, studies(points, random), corner(random), Samples.page("x")));
            checkInside(trend(Figure.SHARE, points, random));
            checkInside(trend(Figure.LEAN, points, random));
        }
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5, 6})
    void aLadderOfAnySizeStaysInsideOfItsFrame(long seed) {
        SplittableRandom random = new SplittableRandom(seed);
        List<Judge> judges = IntStream.range(0, random.nextInt(8))
                .mapToObj(j -> new Judge(LONG_LABEL + j, 1 + random.nextInt(random.nextInt(4) == 0 ? 50 : 4)))
                .toList();
        for (int count : new int[] {0, 1, 20, 60, 61, 700}) {
            checkInside(PieceLadder.of("x", judges, Samples.pieces(count, judges, seed), Samples.page("x")));
        }
    }

    private static void checkInside(Picture picture) {
        Document document = SvgReading.parse(picture.svg());
        String[] box = document.getDocumentElement().getAttribute("viewBox").split(" ", -1);
        double width = Double.parseDouble(box[2]);
        double height = Double.parseDouble(box[3]);
        for (Element element : SvgReading.elements(document, "*")) {
            ACROSS.forEach(name -> checkBetween(element, name, width));
            DOWN.forEach(name -> checkBetween(element, name, height));
            if (element.getTagName().equals("rect")) {
                assertThat(sum(element, "x", "width")).isLessThanOrEqualTo(width + 0.01);
                assertThat(sum(element, "y", "height")).isLessThanOrEqualTo(height + 0.01);
            }
            if (element.getTagName().equals("path")) {
                checkPath(element.getAttribute("d"), width, height);
            }
        }
    }

    private static double sum(Element element, String first, String second) {
        double size = Double.parseDouble(element.getAttribute(second));
        assertThat(size).isNotNegative();
        return Double.parseDouble(element.getAttribute(first)) + size;
    }

    private static void checkBetween(Element element, String name, double most) {
        if (element.hasAttribute(name)) {
            assertThat(element.getAttribute(name)).matches(NUMBER);
            assertThat(Double.parseDouble(element.getAttribute(name))).isBetween(0.0, most);
        }
    }

    private static void checkPath(String path, double width, double height) {
        List<Double> numbers = NUMBER.matcher(path)
                .results()
                .map(found -> Double.parseDouble(found.group()))
                .toList();
        for (int i = 0; i < numbers.size(); i += 2) {
            assertThat(numbers.get(i)).isBetween(0.0, width);
            assertThat(numbers.get(i + 1)).isBetween(0.0, height);
        }
    }

    private static Estimate lean(SplittableRandom random) {
        double c = random.nextDouble(-4, 4);
        double half = random.nextDouble(0, 3);
        return switch (random.nextInt(4)) {
            case 0 -> Estimate.none();
            case 1 -> new Estimate(c, null, null);
            default -> new Estimate(c, c - half, c + half);
        };
    }

    private static Estimate share(SplittableRandom random) {
        return switch (random.nextInt(6)) {
            case 0 -> Estimate.none();
            case 1 -> Samples.share(0, random.nextDouble());
            case 2 -> Samples.share(1, random.nextDouble());
            default -> Samples.share(random.nextDouble(), random.nextDouble() / 3);
        };
    }

    private static List<Double> limits(SplittableRandom random) {
        return random.nextBoolean() ? List.of() : List.of(random.nextDouble(-5, 5));
    }

    private static List<Study> studies(int count, SplittableRandom random) {
        return IntStream.range(0, count)
                .mapToObj(i -> new Study(LONG_LABEL + i, share(random), share(random)))
                .toList();
    }

    private static Corner corner(SplittableRandom random) {
        return new Corner(random.nextDouble(), random.nextInt(3) == 0 ? 0 : random.nextDouble());
    }

    private static Picture trend(Figure figure, int count, SplittableRandom random) {
        List<Point> points = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            LocalDate day = LocalDate.of(2020, 1, 1).plusDays(random.nextInt(1 + random.nextInt(9000)));
            points.add(Samples.point(day, LONG_LABEL, figure == Figure.SHARE ? share(random) : lean(random)));
        }
        List<Limit> limits = random.nextBoolean()
                ? List.of()
                : List.of(new Limit(LONG_LABEL, random.nextDouble(-1, 2), random.nextBoolean()));
        return Trend.of(LONG_LABEL, figure, LONG_LABEL, points, limits, Samples.page("x"));
    }
}
