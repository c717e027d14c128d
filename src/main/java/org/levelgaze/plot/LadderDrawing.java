package org.levelgaze.plot;

import java.util.List;
import org.levelgaze.plot.PieceLadder.Judge;
import org.levelgaze.plot.PieceLadder.Mark;
import org.levelgaze.plot.PieceLadder.Piece;

/** One drawing of a {@link PieceLadder}. */
final class LadderDrawing {

    private static final double ROW = 20;
    private static final double STEP = 17;
    private static final double GAP = 16;
    private static final double LABEL = 108;
    private static final double STATE = 112;
    private static final double COUNT = 72;
    private static final double HEAD = 34;
    private static final double LEGEND = 30;
    private static final double LEAST_GROUP = 66;
    private static final double BAR = 240;
    private static final double LEAST_WIDTH = 560;

    private final List<Judge> judges;
    private final List<Piece> shown;
    private final List<String> rest;
    private final Drawing drawing;
    private final boolean asBars;
    private final double width;

    LadderDrawing(List<Judge> judges, List<Piece> shown, List<String> rest, Drawing drawing) {
        this.judges = judges;
        this.shown = shown;
        this.rest = rest;
        this.drawing = drawing;
        this.asBars = judges.stream().mapToInt(Judge::trials).sum() > PieceLadder.MOST_MARKS;
        double calls =
                asBars ? BAR : judges.stream().mapToDouble(LadderDrawing::group).sum();
        this.width = Math.max(LEAST_WIDTH, LABEL + STATE + calls + COUNT);
    }

    String svg(String title, String description) {
        double rows = HEAD + ROW * shown.size();
        double height = rows + ROW * rest.size() + LEGEND + 6;
        SvgWriter svg = Canvas.open(drawing, "plot-ladder", width, height, false, title, description);
        head(svg);
        for (int i = 0; i < shown.size(); i++) {
            rung(svg, shown.get(i), HEAD + ROW * i);
        }
        for (int i = 0; i < rest.size(); i++) {
            svg.text(rest.get(i), 4, rows + ROW * i + 15, "start", 14, Tone.INK_SOFT);
        }
        legend(svg, height - 12);
        return svg.close().toString();
    }

    private static double group(Judge judge) {
        return Math.max(LEAST_GROUP, judge.trials() * STEP) + GAP;
    }

    private void head(SvgWriter svg) {
        svg.text(cut("plot.ladder.piece", LABEL), 4, 20, "start", 13, Tone.INK_SOFT);
        svg.text(cut("plot.ladder.state", STATE), LABEL, 20, "start", 13, Tone.INK_SOFT);
        double x = LABEL + STATE;
        if (asBars) {
            svg.text(cut("plot.ladder.share", BAR), x, 20, "start", 13, Tone.INK_SOFT);
            x += BAR;
        } else {
            for (Judge judge : judges) {
                svg.open("g").words("title", judge.name());
                svg.text(Canvas.cut(judge.name(), group(judge) - 4, 13), x, 20, "start", 13, Tone.INK);
                svg.close();
                x += group(judge);
            }
        }
        svg.text(cut("plot.ladder.wrong", COUNT), x, 20, "start", 13, Tone.INK_SOFT);
        svg.line(0, HEAD - 5, width, HEAD - 5, Tone.EDGE, 1);
    }

    private String cut(String key, double room) {
        return Canvas.cut(drawing.text(key), room - 4, 13);
    }

    private void rung(SvgWriter svg, Piece piece, double top) {
        double y = top + ROW / 2;
        String count = PieceLadder.count(piece.wrong(), piece.judged(), drawing);
        svg.open("g", "class", "plot-rung");
        svg.words("title", piece.label() + ", " + PieceLadder.state(piece, drawing) + ": " + count);
        svg.text(Canvas.cut(piece.label(), LABEL - 8, 14), 4, y + 5, "start", 14, Tone.INK);
        svg.text(
                Canvas.cut(PieceLadder.state(piece, drawing), STATE - 6, 14), LABEL, y + 5, "start", 14, Tone.INK_SOFT);
        double x = LABEL + STATE;
        x = asBars ? bar(svg, piece, x, y) : marks(svg, piece, x, y);
        svg.text(count, x, y + 5, "start", 14, piece.wrong() > 0 ? Tone.INK : Tone.INK_SOFT);
        svg.line(0, top + ROW, width, top + ROW, Tone.RULE, 0.75);
        svg.close();
    }

    private double marks(SvgWriter svg, Piece piece, double start, double y) {
        double x = start;
        for (int j = 0; j < judges.size(); j++) {
            List<Mark> calls = piece.calls().get(j);
            for (int trial = 0; trial < calls.size(); trial++) {
                mark(svg, calls.get(trial), x + 6 + trial * STEP, y);
            }
            x += group(judges.get(j));
        }
        return x;
    }

    private static double bar(SvgWriter svg, Piece piece, double x, double y) {
        double full = BAR - 24;
        svg.line(x, y, x + full, y, Tone.RULE, 1.5);
        if (piece.wrong() > 0) {
            block(svg, piece.isDefective(), x, y, Math.max(1.5, full * piece.wrong() / piece.judged()));
        }
        return x + BAR;
    }

    private static void mark(SvgWriter svg, Mark mark, double x, double y) {
        switch (mark) {
            case RIGHT -> Marks.dot(svg, x, y, 1.9, Tone.EDGE);
            case FALSE_ACCEPT -> Marks.lenient(svg, x, y, 5.5);
            case FALSE_REJECT -> Marks.strict(svg, x, y, 5.5);
            case NOT_JUDGED -> svg.line(x - 4, y, x + 4, y, Tone.EDGE, 1.25);
        }
    }

    private void legend(SvgWriter svg, double y) {
        List<Mark> used = asBars ? List.of(Mark.FALSE_ACCEPT, Mark.FALSE_REJECT) : List.of(Mark.values());
        double x = 10;
        for (Mark mark : used) {
            if (asBars) {
                block(svg, mark == Mark.FALSE_ACCEPT, x - 5, y - 4, 10);
            } else {
                mark(svg, mark, x, y - 4);
            }
            String label = drawing.text("plot.ladder.mark." + mark.name());
            svg.text(label, x + 11, y, "start", 13, Tone.INK_SOFT);
            x += 34 + 6.4 * label.length();
        }
    }

    private static void block(SvgWriter svg, boolean isFalseAccept, double x, double y, double width) {
        Tone tone = isFalseAccept ? Tone.LENIENT : Tone.STRICT;
        svg.leaf("rect", "x", x, "y", y - 5, "width", width, "height", 10, "class", tone.fill(), "fill", tone.paper());
    }
}
