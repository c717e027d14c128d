package org.levelgaze.plot;

import java.time.LocalDate;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.Optional;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;

/**
 * One figure from study to study: days across, the figure up, its interval at each point, limits drawn. A point beyond a
 * limit has another shape as well as another colour.
 */
public final class Trend {

    /** What the figure is. */
    public enum Figure {
        /** A share of 1, such as an effectiveness or an error rate. */
        SHARE(Numerals.SHARE),
        /** The criterion c in standard deviations; 0 is even, above is lenient. */
        LEAN(Numerals.DECIMAL);

        private final Numerals numerals;

        Figure(Numerals numerals) {
            this.numerals = numerals;
        }

        Numerals numerals() {
            return numerals;
        }
    }

    /**
     * One study's figure.
     *
     * @param day when the study was made
     * @param dayText the day as the reader's language writes it, plain text
     * @param name the study's name, plain text
     * @param figure the figure, undefined where the study says nothing about it
     */
    public record Point(LocalDate day, String dayText, String name, Estimate figure) {}

    /**
     * What the criteria ask.
     *
     * @param name its name, plain text
     * @param at where it lies, in the unit of the figure
     * @param isLeast whether the figure must be at least there, else at most
     */
    public record Limit(String name, double at, boolean isLeast) {

        /** Refuses what is not finite. */
        public Limit {
            if (!Double.isFinite(at)) {
                throw new IllegalArgumentException("A limit is finite, not " + at);
            }
        }

        boolean isBroken(double figure) {
            return isLeast ? figure < at : figure > at;
        }
    }

    private Trend() {}

    /**
     * Draws the studies in the order of their days.
     *
     * @param title whose figure it is, and which
     * @param figure what the figure is
     * @param figureName its name, beside the axis, plain text
     * @param points the studies, in any order
     * @param limits what the criteria ask; empty for none
     */
    public static Picture of(
            String title, Figure figure, String figureName, List<Point> points, List<Limit> limits, Drawing drawing) {
        List<Point> inOrder =
                points.stream().sorted((a, b) -> a.day().compareTo(b.day())).toList();
        return new TrendDrawing(figure, figureName, inOrder, limits, drawing).picture(title);
    }

    /** The numbers up: shares get a round window, c one that is even on both sides. */
    static Axis up(Figure figure, List<Point> points, List<Limit> limits, double start, double end) {
        double[] reached = Stream.concat(
                        points.stream()
                                .map(Point::figure)
                                .flatMap(f -> Stream.of(
                                        Optional.ofNullable(f.value()),
                                        Optional.ofNullable(f.low()),
                                        Optional.ofNullable(f.high())))
                                .flatMap(Optional::stream),
                        limits.stream().map(Limit::at))
                .mapToDouble(Double::doubleValue)
                .toArray();
        double least = reached.length == 0 ? 0 : Double.MAX_VALUE;
        double most = reached.length == 0 ? 1 : -Double.MAX_VALUE;
        for (double number : reached) {
            least = Math.min(least, number);
            most = Math.max(most, number);
        }
        if (figure == Figure.LEAN) {
            double half = Math.min(3, Math.max(1, Math.ceil(2 * Math.max(-least, most)) / 2));
            return new Axis(-half, half, start, end);
        }
        double from = Math.max(0, Math.floor(10 * least - 1e-9) / 10);
        double to = Math.min(1, Math.ceil(10 * most + 1e-9) / 10);
        return to - from < 0.2
                ? new Axis(Math.max(0, Math.min(from, 0.8)), Math.max(0, Math.min(from, 0.8)) + 0.2, start, end)
                : new Axis(from, to, start, end);
    }

    static String sentence(Figure figure, Point point, List<Limit> limits, Drawing drawing) {
        String written = Shares.written(point.figure(), figure.numerals(), drawing);
        String sentence = drawing.text("plot.trend.sentence", point.dayText(), point.name(), written);
        return broken(point, limits)
                .map(limit -> sentence + " " + beyond(figure, limit, drawing))
                .orElse(sentence);
    }

    static Optional<Limit> broken(Point point, List<Limit> limits) {
        Double value = point.figure().value();
        return value == null
                ? Optional.empty()
                : limits.stream().filter(limit -> limit.isBroken(value)).findFirst();
    }

    private static String beyond(Figure figure, Limit limit, Drawing drawing) {
        return drawing.text(
                limit.isLeast() ? "plot.trend.below" : "plot.trend.above",
                limit.name(),
                figure.numerals().of(limit.at(), drawing.locale()));
    }

    static List<String> row(Figure figure, Point point, List<Limit> limits, Drawing drawing) {
        Locale locale = drawing.locale();
        Numerals numerals = figure.numerals();
        return List.of(
                point.dayText(),
                point.name(),
                numerals.orDash(point.figure().value(), locale),
                numerals.orDash(point.figure().low(), locale),
                numerals.orDash(point.figure().high(), locale),
                broken(point, limits)
                        .map(limit -> beyond(figure, limit, drawing))
                        .orElse(""));
    }

    static double value(Point point) {
        @Nullable Double value = point.figure().value();
        return Objects.requireNonNull(value);
    }
}
