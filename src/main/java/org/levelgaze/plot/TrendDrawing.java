package org.levelgaze.plot;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import org.levelgaze.plot.Trend.Figure;
import org.levelgaze.plot.Trend.Limit;
import org.levelgaze.plot.Trend.Point;

/** One drawing of a {@link Trend}. */
final class TrendDrawing {

    private static final int WIDTH = 700;
    private static final int HEIGHT = 300;
    private static final int LEFT = 58;
    private static final int RIGHT = 684;
    private static final int TOP = 40;
    private static final int BOTTOM = 252;

    /** How many of the latest studies can be reached by keyboard; the table has them all. */
    private static final int REACHABLE = 24;

    /** With more points than this the marks get smaller. */
    private static final int MANY = 80;

    private final Figure figure;
    private final String figureName;
    private final List<Point> points;
    private final List<Limit> limits;
    private final Drawing drawing;
    private final List<Point> drawn;
    private final Axis up;
    private final Axis days;

    TrendDrawing(Figure figure, String figureName, List<Point> inOrder, List<Limit> limits, Drawing drawing) {
        this.figure = figure;
        this.figureName = figureName;
        this.points = inOrder;
        this.limits = limits;
        this.drawing = drawing;
        this.drawn =
                inOrder.stream().filter(point -> point.figure().value() != null).toList();
        this.up = Trend.up(figure, drawn, limits, BOTTOM, TOP);
        this.days = days();
    }

    Picture picture(String title) {
        SvgWriter svg = Canvas.open(drawing, "plot-trend", WIDTH, HEIGHT, !drawn.isEmpty(), title, description());
        ground(svg);
        limits.stream()
                .filter(limit -> up.holds(limit.at()))
                .forEach(limit -> svg.dashed(LEFT, up.at(limit.at()), RIGHT, up.at(limit.at()), Tone.ACCENT));
        join(svg);
        for (int i = 0; i < drawn.size(); i++) {
            point(svg, drawn.get(i), drawing.interactive() && i >= drawn.size() - REACHABLE);
        }
        limits.stream().filter(limit -> up.holds(limit.at())).forEach(limit -> limitName(svg, limit));
        if (drawn.isEmpty()) {
            svg.over(drawing.text("plot.none"), (LEFT + RIGHT) / 2.0, 150, "middle", 15, Tone.INK);
        }
        svg.close();
        List<String> head = List.of(
                drawing.text("plot.day"),
                drawing.text("plot.study"),
                figureName,
                drawing.text("plot.from"),
                drawing.text("plot.to"),
                drawing.text("plot.trend.held"));
        List<List<String>> rows = points.stream()
                .map(point -> Trend.row(figure, point, limits, drawing))
                .toList();
        return new Picture(svg.toString(), drawing.text("plot.trend.caption"), head, rows);
    }

    private String description() {
        return drawn.isEmpty()
                ? drawing.text("plot.none")
                : Trend.sentence(figure, drawn.get(drawn.size() - 1), limits, drawing);
    }

    /** Days across with a margin on both sides; one day alone stands in the middle. */
    private Axis days() {
        if (drawn.isEmpty()) {
            return new Axis(0, 1, LEFT, RIGHT);
        }
        long first = drawn.get(0).day().toEpochDay();
        long last = drawn.get(drawn.size() - 1).day().toEpochDay();
        return first == last
                ? new Axis(first - 1.0, last + 1.0, LEFT, RIGHT)
                : new Axis(first, last, LEFT + 24, RIGHT - 24);
    }

    private double x(Point point) {
        return x(point.day());
    }

    private double x(LocalDate day) {
        return days.at((double) day.toEpochDay());
    }

    private double y(Point point) {
        return up.at(Trend.value(point));
    }

    private void ground(SvgWriter svg) {
        for (double tick : up.ticks(5)) {
            boolean even = figure == Figure.LEAN && tick == 0;
            svg.line(LEFT, up.at(tick), RIGHT, up.at(tick), even ? Tone.EDGE : Tone.RULE, even ? 1.5 : 0.75);
            String label = figure == Figure.SHARE
                    ? Numerals.SHARE.of(tick, drawing.locale())
                    : Numerals.SHORT.of(tick, drawing.locale());
            svg.text(label, LEFT - 8, up.at(tick) + 4, "end", 13, Tone.INK_SOFT);
        }
        svg.line(LEFT, BOTTOM, RIGHT, BOTTOM, Tone.EDGE, 1.25);
        svg.text(Canvas.cut(figureName, 420, 14), 4, 20, "start", 14, Tone.INK);
        if (figure == Figure.LEAN) {
            svg.heading(drawing.text("plot.lean.lenient"), RIGHT, TOP - 12, "end", 14, Tone.LENIENT);
            svg.heading(drawing.text("plot.lean.strict"), RIGHT, BOTTOM + 42, "end", 14, Tone.STRICT);
        }
        if (!drawn.isEmpty()) {
            dates(svg);
        }
    }

    private void dates(SvgWriter svg) {
        Point first = drawn.get(0);
        Point last = drawn.get(drawn.size() - 1);
        int from = first.day().getYear() + 1;
        for (int year : years(from, last.day().getYear())) {
            double x = x(LocalDate.of(year, 1, 1));
            svg.line(x, BOTTOM, x, BOTTOM + 5, Tone.EDGE, 1.25);
            if (x > LEFT + 130 && x < RIGHT - 130) {
                svg.text(Integer.toString(year), x, BOTTOM + 21, "middle", 13, Tone.INK_SOFT);
            }
        }
        boolean apart = !first.day().equals(last.day());
        svg.text(first.dayText(), apart ? LEFT : x(first), BOTTOM + 21, apart ? "start" : "middle", 13, Tone.INK_SOFT);
        if (apart) {
            svg.text(last.dayText(), RIGHT, BOTTOM + 21, "end", 13, Tone.INK_SOFT);
        }
    }

    /** The starts of years, thinned so that their numbers do not touch. */
    private static List<Integer> years(int from, int to) {
        int step = Math.max(1, (to - from) / 8 + 1);
        List<Integer> years = new ArrayList<>();
        for (int year = from; year <= to; year += step) {
            years.add(year);
        }
        return years;
    }

    private void limitName(SvgWriter svg, Limit limit) {
        double y = up.at(limit.at());
        String label = limit.name() + " " + figure.numerals().of(limit.at(), drawing.locale());
        double below = (limit.isLeast() && y + 17 < BOTTOM) || y - 7 < TOP ? 15 : -6;
        svg.over(Canvas.cut(label, 300, 13), LEFT + 4, y + below, "start", 13, Tone.ACCENT);
    }

    private void join(SvgWriter svg) {
        if (drawn.size() < 2) {
            return;
        }
        List<Object> steps = new ArrayList<>();
        for (Point point : drawn) {
            steps.add(steps.isEmpty() ? "M" : "L");
            steps.add(x(point));
            steps.add(y(point));
        }
        svg.leaf(
                "path",
                "d",
                Marks.path(steps.toArray()),
                "fill",
                "none",
                "class",
                Tone.INK_SOFT.line(),
                "stroke",
                Tone.INK_SOFT.paper(),
                "stroke-width",
                1,
                "stroke-opacity",
                0.6);
    }

    private void point(SvgWriter svg, Point point, boolean reachable) {
        Canvas.openPoint(svg, reachable, Trend.sentence(figure, point, limits, drawing));
        boolean outside = Trend.broken(point, limits).isPresent();
        double size = drawn.size() > MANY ? 0.5 : 1;
        bar(svg, point, outside ? Tone.FAULT : Tone.INK_SOFT, size);
        if (outside) {
            Marks.diamond(svg, x(point), y(point), 7.5 * size, Tone.FAULT);
        } else {
            Marks.dot(svg, x(point), y(point), 5 * size, Tone.INK);
        }
        svg.close();
    }

    private void bar(SvgWriter svg, Point point, Tone tone, double size) {
        Double low = point.figure().low();
        Double high = point.figure().high();
        if (low == null || high == null) {
            return;
        }
        double x = x(point);
        svg.line(x, up.at(low), x, up.at(high), tone, 1.5 * size);
        for (double end : new double[] {low, high}) {
            if (up.holds(end)) {
                svg.line(x - 4 * size, up.at(end), x + 4 * size, up.at(end), tone, 1.5 * size);
            }
        }
    }
}
