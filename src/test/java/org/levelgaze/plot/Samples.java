package org.levelgaze.plot;

import java.time.LocalDate;
import java.time.format.DateTimeFormatter;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.SplittableRandom;
import org.levelgaze.plot.MistakePlane.Corner;
import org.levelgaze.plot.MistakePlane.Study;
import org.levelgaze.plot.PieceLadder.Judge;
import org.levelgaze.plot.PieceLadder.Mark;
import org.levelgaze.plot.PieceLadder.Piece;
import org.levelgaze.plot.Trend.Figure;
import org.levelgaze.plot.Trend.Limit;
import org.levelgaze.plot.Trend.Point;

/** Invented readings: hand-glazed stoneware, judged by three people. */
final class Samples {

    static final Corner CORNER = new Corner(0.10, 0.05);
    static final Limit AT_LEAST = new Limit("at least", 0.8, true);

    private Samples() {}

    static Drawing page(String id) {
        return new Drawing(id, true, Locale.ENGLISH, new BundledTexts(Locale.ENGLISH));
    }

    static Drawing german(String id) {
        return new Drawing(id, true, Locale.GERMAN, new BundledTexts(Locale.GERMAN));
    }

    static Drawing paper(String id) {
        return new Drawing(id, false, Locale.ENGLISH, new BundledTexts(Locale.ENGLISH));
    }

    static List<Study> studies() {
        return List.of(
                new Study("S-2", share(0.22, 0.1), share(0.04, 0.04)),
                new Study("S-5", share(0.16, 0.08), share(0.06, 0.05)),
                new Study("S-7", share(0.10, 0.06), share(0.10, 0.06)),
                new Study("S-9", share(0.06, 0.05), share(0.16, 0.08)));
    }

    static List<Point> effectiveness() {
        return List.of(
                point(LocalDate.of(2025, 3, 12), "S-2", share(0.92, 0.07)),
                point(LocalDate.of(2025, 9, 3), "S-5", share(0.88, 0.08)),
                point(LocalDate.of(2026, 3, 9), "S-7", share(0.84, 0.09)),
                point(LocalDate.of(2026, 9, 1), "S-9", share(0.76, 0.11)));
    }

    static List<Point> lean() {
        return List.of(
                point(LocalDate.of(2025, 3, 12), "S-2", new Estimate(-0.42, -0.8, -0.04)),
                point(LocalDate.of(2025, 9, 3), "S-5", new Estimate(-0.2, -0.55, 0.15)),
                point(LocalDate.of(2026, 3, 9), "S-7", new Estimate(0.05, -0.3, 0.4)),
                point(LocalDate.of(2026, 9, 1), "S-9", new Estimate(0.5, 0.1, 0.9)));
    }

    static Point point(LocalDate day, String name, Estimate figure) {
        return new Point(
                day, DateTimeFormatter.ofPattern("d MMM yyyy", Locale.ENGLISH).format(day), name, figure);
    }

    static Estimate share(double value, double half) {
        return new Estimate(value, Math.max(0, value - half), Math.min(1, value + half));
    }

    static List<Judge> judges() {
        return List.of(new Judge("Ana", 3), new Judge("Bruno", 3), new Judge("Chidi", 3));
    }

    /** Pieces of which about every fifth call is wrong. */
    static List<Piece> pieces(int count, List<Judge> judges, long seed) {
        SplittableRandom random = new SplittableRandom(seed);
        List<Piece> pieces = new ArrayList<>();
        for (int i = 1; i <= count; i++) {
            boolean defective = random.nextBoolean();
            double difficulty = random.nextInt(4) == 0 ? 0.55 : 0.02;
            List<List<Mark>> calls = new ArrayList<>();
            for (Judge judge : judges) {
                List<Mark> marks = new ArrayList<>();
                for (int trial = 0; trial < judge.trials(); trial++) {
                    marks.add(mark(defective, difficulty, random));
                }
                calls.add(marks);
            }
            pieces.add(new Piece("P-" + i, defective, calls));
        }
        return pieces;
    }

    private static Mark mark(boolean defective, double difficulty, SplittableRandom random) {
        if (random.nextInt(60) == 0) {
            return Mark.NOT_JUDGED;
        }
        if (random.nextDouble() >= difficulty) {
            return Mark.RIGHT;
        }
        return defective ? Mark.FALSE_ACCEPT : Mark.FALSE_REJECT;
    }

    /** One of each picture, drawn as asked. */
    static List<Picture> all(Drawing drawing) {
        return List.of(
                LeanScale.row("Ana", new Estimate(0.42, 0.1, 0.74), List.of(), drawing.named("a")),
                LeanScale.row("Bruno", new Estimate(-0.1, -0.5, 0.3), List.of(), drawing.named("b")),
                LeanScale.row("Chidi", new Estimate(-0.9, -2.6, -0.4), List.of(-1.0, 1.0), drawing.named("c")),
                LeanScale.row("Nobody", Estimate.none(), List.of(), drawing.named("d")),
                LeanScale.form("Ana", new Estimate(0.42, 0.1, 0.74), List.of(), drawing.named("e")),
                MistakePlane.of("Where do the mistakes of Ana go?", studies(), CORNER, drawing.named("f")),
                Trend.of(
                        "Effectiveness of Ana",
                        Figure.SHARE,
                        "Effectiveness",
                        effectiveness(),
                        List.of(AT_LEAST),
                        drawing.named("g")),
                Trend.of("Lean of Ana", Figure.LEAN, "c", lean(), List.of(), drawing.named("h")),
                PieceLadder.of("Glaze, set G-04", judges(), pieces(20, judges(), 7), drawing.named("i")));
    }
}
