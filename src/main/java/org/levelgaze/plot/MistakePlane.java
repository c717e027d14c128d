package org.levelgaze.plot;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;

/**
 * The mistake plane: across the share of good pieces refused, up the share of defective pieces let through. The
 * present study is a dot in the box of its two exact intervals; earlier studies are a fading trail; the corner that the
 * criteria allow is shaded; the diagonal parts lenient (above) from strict (below).
 */
public final class MistakePlane {

    private static final int WIDTH = 440;
    private static final int HEIGHT = 452;

    /** How many of the latest studies can be reached by keyboard; the table has them all. */
    private static final int REACHABLE = 24;

    /**
     * One study.
     *
     * @param name its name, as plain text
     * @param falseReject the share of good pieces refused, 0 to 1, undefined without calls on good pieces
     * @param falseAccept the share of defective pieces let through, 0 to 1, undefined without such calls
     */
    public record Study(String name, Estimate falseReject, Estimate falseAccept) {

        /** Refuses what is not a share. */
        public Study {
            Shares.check(falseReject);
            Shares.check(falseAccept);
        }
    }

    /**
     * What the criteria allow.
     *
     * @param maxFalseReject a share, 0 to 1
     * @param maxFalseAccept a share, 0 to 1
     */
    public record Corner(double maxFalseReject, double maxFalseAccept) {

        /** Refuses what is not a share. */
        public Corner {
            Shares.check(maxFalseReject);
            Shares.check(maxFalseAccept);
        }
    }

    private MistakePlane() {}

    /**
     * Draws studies of one appraiser.
     *
     * @param title whose mistakes they are
     * @param studies the oldest first; the last is the present one
     * @param corner what the criteria allow, {@code null} for none
     */
    public static Picture of(String title, List<Study> studies, @Nullable Corner corner, Drawing drawing) {
        List<Study> drawn = studies.stream().filter(MistakePlane::hasPlace).toList();
        double end = end(drawn, corner);
        Axis across = new Axis(0, end, 58, 424);
        Axis up = new Axis(0, end, 406, 40);
        SvgWriter svg = Canvas.open(
                drawing, "plot-plane", WIDTH, HEIGHT, !drawn.isEmpty(), title, description(studies, drawing));
        ground(svg, across, up, corner, drawing);
        trail(svg, across, up, drawn);
        for (int i = 0; i < drawn.size(); i++) {
            point(svg, across, up, drawn, i, drawing);
        }
        if (drawn.isEmpty()) {
            svg.over(drawing.text("plot.none"), across.at(end / 2), up.at(end / 3), "middle", 15, Tone.INK);
        }
        svg.close();
        return new Picture(svg.toString(), drawing.text("plot.plane.caption"), head(drawing), rows(studies, drawing));
    }

    private static boolean hasPlace(Study study) {
        return study.falseReject().value() != null && study.falseAccept().value() != null;
    }

    /** Both axes end at the same share, the smallest round one that holds the present box, every dot and the corner. */
    private static double end(List<Study> drawn, @Nullable Corner corner) {
        double most = corner == null ? 0 : Math.max(corner.maxFalseAccept(), corner.maxFalseReject()) * 1.2;
        for (int i = 0; i < drawn.size(); i++) {
            boolean present = i == drawn.size() - 1;
            for (Estimate share :
                    List.of(drawn.get(i).falseReject(), drawn.get(i).falseAccept())) {
                most = Math.max(most, Shares.reach(share, present));
            }
        }
        for (double end : new double[] {0.1, 0.2, 0.3, 0.4, 0.5}) {
            if (most <= end) {
                return end;
            }
        }
        return 1;
    }

    private static void ground(SvgWriter svg, Axis across, Axis up, @Nullable Corner corner, Drawing drawing) {
        Locale locale = drawing.locale();
        if (corner != null) {
            double right = across.at(corner.maxFalseReject());
            double top = up.at(corner.maxFalseAccept());
            svg.leaf(
                    "rect",
                    "x",
                    across.start(),
                    "y",
                    top,
                    "width",
                    right - across.start(),
                    "height",
                    up.start() - top,
                    "class",
                    Tone.ACCENT.fill(),
                    "fill",
                    Tone.ACCENT.paper(),
                    "fill-opacity",
                    0.14);
            svg.dashed(across.start(), top, right, top, Tone.ACCENT);
            svg.dashed(right, top, right, up.start(), Tone.ACCENT);
        }
        for (double tick : across.ticks(5)) {
            svg.line(across.at(tick), up.start(), across.at(tick), up.end(), Tone.RULE, 0.75);
            svg.line(across.start(), up.at(tick), across.end(), up.at(tick), Tone.RULE, 0.75);
            String label = Numerals.SHARE.of(tick, locale);
            svg.text(label, Math.min(across.at(tick), 418), 423, "middle", 13, Tone.INK_SOFT);
            if (tick > 0) {
                svg.text(label, 52, up.at(tick) + 4, "end", 13, Tone.INK_SOFT);
            }
        }
        svg.line(across.start(), up.start(), across.end(), up.start(), Tone.EDGE, 1.25);
        svg.line(across.start(), up.start(), across.start(), up.end(), Tone.EDGE, 1.25);
        svg.dashed(across.start(), up.start(), across.end(), up.end(), Tone.EDGE);
        svg.text(drawing.text("plot.plane.falseAccept"), 4, 20, "start", 14, Tone.INK);
        svg.text(drawing.text("plot.plane.falseReject"), 436, 444, "end", 14, Tone.INK);
        svg.heading(drawing.text("plot.lean.lenient"), 68, 58, "start", 14, Tone.LENIENT);
        svg.heading(drawing.text("plot.lean.strict"), 418, 398, "end", 14, Tone.STRICT);
    }

    private static void trail(SvgWriter svg, Axis across, Axis up, List<Study> drawn) {
        for (int i = 1; i < drawn.size(); i++) {
            svg.leaf(
                    "line",
                    "x1",
                    x(across, drawn.get(i - 1)),
                    "y1",
                    y(up, drawn.get(i - 1)),
                    "x2",
                    x(across, drawn.get(i)),
                    "y2",
                    y(up, drawn.get(i)),
                    "class",
                    Tone.INK_SOFT.line(),
                    "stroke",
                    Tone.INK_SOFT.paper(),
                    "stroke-width",
                    1.25,
                    "stroke-opacity",
                    strength(i, drawn.size()));
        }
    }

    private static void point(SvgWriter svg, Axis across, Axis up, List<Study> drawn, int index, Drawing drawing) {
        Study study = drawn.get(index);
        boolean present = index == drawn.size() - 1;
        boolean reachable = drawing.interactive() && index >= drawn.size() - REACHABLE;
        Canvas.openPoint(svg, reachable, sentence(study, drawing));
        if (present) {
            box(svg, across, up, study);
            Marks.dot(svg, x(across, study), y(up, study), 6.5, Tone.ACCENT);
        } else {
            svg.leaf(
                    "circle",
                    "cx",
                    x(across, study),
                    "cy",
                    y(up, study),
                    "r",
                    3.75,
                    "class",
                    Tone.PAPER.fill() + " " + Tone.INK_SOFT.line(),
                    "fill",
                    Tone.PAPER.paper(),
                    "stroke",
                    Tone.INK_SOFT.paper(),
                    "stroke-width",
                    1.5,
                    "stroke-opacity",
                    strength(index, drawn.size()));
        }
        svg.close();
    }

    private static void box(SvgWriter svg, Axis across, Axis up, Study study) {
        Estimate reject = study.falseReject();
        Estimate accept = study.falseAccept();
        if (reject.low() == null || reject.high() == null || accept.low() == null || accept.high() == null) {
            return;
        }
        double left = across.at(reject.low());
        double top = up.at(accept.high());
        svg.leaf(
                "rect",
                "x",
                left,
                "y",
                top,
                "width",
                across.at(reject.high()) - left,
                "height",
                up.at(accept.low()) - top,
                "class",
                Tone.ACCENT.line(),
                "fill",
                "none",
                "stroke",
                Tone.ACCENT.paper(),
                "stroke-width",
                1.5);
    }

    /** The older, the fainter, yet never so faint that it is lost. */
    private static double strength(int index, int count) {
        return 0.5 + 0.5 * index / count;
    }

    private static double x(Axis across, Study study) {
        return across.at(Shares.reach(study.falseReject(), false));
    }

    private static double y(Axis up, Study study) {
        return up.at(Shares.reach(study.falseAccept(), false));
    }

    private static String description(List<Study> studies, Drawing drawing) {
        return studies.isEmpty() ? drawing.text("plot.none") : sentence(studies.get(studies.size() - 1), drawing);
    }

    private static String sentence(Study study, Drawing drawing) {
        return drawing.text(
                "plot.plane.sentence",
                study.name(),
                Shares.written(study.falseAccept(), drawing),
                Shares.written(study.falseReject(), drawing));
    }

    private static List<String> head(Drawing drawing) {
        return List.of(
                drawing.text("plot.study"),
                drawing.text("plot.plane.falseAccept"),
                drawing.text("plot.from"),
                drawing.text("plot.to"),
                drawing.text("plot.plane.falseReject"),
                drawing.text("plot.from"),
                drawing.text("plot.to"));
    }

    private static List<List<String>> rows(List<Study> studies, Drawing drawing) {
        List<List<String>> rows = new ArrayList<>();
        for (Study study : studies) {
            Estimate accept = study.falseAccept();
            Estimate reject = study.falseReject();
            List<String> row = new ArrayList<>(List.of(study.name()));
            Stream.of(accept.value(), accept.low(), accept.high(), reject.value(), reject.low(), reject.high())
                    .map(share -> Numerals.SHARE.orDash(share, drawing.locale()))
                    .forEach(row::add);
            rows.add(row);
        }
        return rows;
    }
}
