package org.levelgaze.plot;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;

/**
 * The piece ladder: pieces sorted by how often they are miscalled, each a row of small marks, one per call, grouped by
 * appraiser. It shows true states: only for who may see the answer key.
 */
public final class PieceLadder {

    /** How many pieces are drawn at most; with more, miscalled ones only. */
    public static final int MOST_PIECES = 60;

    /** How many calls of a piece get a mark each; with more, a bar shows the share that is wrong. */
    static final int MOST_MARKS = 48;

    /** One call held against the true state. */
    public enum Mark {
        /** The call is the true state. */
        RIGHT,
        /** A defective piece was let through. */
        FALSE_ACCEPT,
        /** A good piece was refused. */
        FALSE_REJECT,
        /** There is no call. */
        NOT_JUDGED;

        boolean isWrong() {
            return this == FALSE_ACCEPT || this == FALSE_REJECT;
        }
    }

    /**
     * Who judged.
     *
     * @param name plain text
     * @param trials how many trials, 1 or more
     */
    public record Judge(String name, int trials) {

        /** Refuses a judge without trials. */
        public Judge {
            if (trials < 1) {
                throw new IllegalArgumentException(name + " has " + trials + " trials");
            }
        }
    }

    /**
     * A piece and its calls.
     *
     * @param label plain text
     * @param isDefective its true state
     * @param calls for every judge, in their order, one mark per trial
     */
    public record Piece(String label, boolean isDefective, List<List<Mark>> calls) {

        /** Keeps its own copies. */
        public Piece {
            calls = calls.stream().map(List::copyOf).toList();
        }

        long wrong() {
            return marks().filter(Mark::isWrong).count();
        }

        long judged() {
            return marks().filter(mark -> mark != Mark.NOT_JUDGED).count();
        }

        private Stream<Mark> marks() {
            return calls.stream().flatMap(List::stream);
        }
    }

    private PieceLadder() {}

    /**
     * Draws the ladder.
     *
     * @param title what was judged
     * @param judges who judged, in the order of the groups
     * @param pieces all pieces of the study, in any order
     */
    public static Picture of(String title, List<Judge> judges, List<Piece> pieces, Drawing drawing) {
        pieces.forEach(piece -> check(judges, piece));
        List<Piece> worstFirst = pieces.stream()
                .sorted(Comparator.comparingLong(Piece::wrong).reversed())
                .toList();
        List<Piece> shown = pieces.size() <= MOST_PIECES
                ? worstFirst
                : worstFirst.stream()
                        .filter(piece -> piece.wrong() > 0)
                        .limit(MOST_PIECES)
                        .toList();
        String svg = new LadderDrawing(judges, shown, rest(pieces, shown, drawing), drawing)
                .svg(title, description(pieces, drawing));
        return new Picture(svg, drawing.text("plot.ladder.caption"), head(judges, drawing), rows(shown, drawing));
    }

    private static void check(List<Judge> judges, Piece piece) {
        List<Integer> expected = judges.stream().map(Judge::trials).toList();
        List<Integer> found = piece.calls().stream().map(List::size).toList();
        if (!expected.equals(found)) {
            throw new IllegalArgumentException(
                    "Piece " + piece.label() + " has " + found + " calls by judge, not " + expected);
        }
    }

    private static String description(List<Piece> pieces, Drawing drawing) {
        long miscalled = pieces.stream().filter(piece -> piece.wrong() > 0).count();
        return drawing.text("plot.ladder.sentence", miscalled, pieces.size());
    }

    /** What is not drawn, in words; empty when all is. */
    private static List<String> rest(List<Piece> pieces, List<Piece> shown, Drawing drawing) {
        long right = pieces.stream().filter(piece -> piece.wrong() == 0).count();
        long shownRight = shown.stream().filter(piece -> piece.wrong() == 0).count();
        long wrongLeft = pieces.size() - right - (shown.size() - shownRight);
        List<String> sentences = new ArrayList<>();
        if (wrongLeft > 0) {
            sentences.add(drawing.text("plot.ladder.more", wrongLeft));
        }
        if (right > shownRight) {
            sentences.add(drawing.text("plot.ladder.right", right - shownRight));
        }
        return sentences;
    }

    private static List<String> head(List<Judge> judges, Drawing drawing) {
        List<String> head = new ArrayList<>(List.of(
                drawing.text("plot.ladder.piece"),
                drawing.text("plot.ladder.state"),
                drawing.text("plot.ladder.wrong")));
        judges.forEach(judge -> head.add(judge.name()));
        return head;
    }

    private static List<List<String>> rows(List<Piece> shown, Drawing drawing) {
        List<List<String>> rows = new ArrayList<>();
        for (Piece piece : shown) {
            List<String> row = new ArrayList<>(
                    List.of(piece.label(), state(piece, drawing), count(piece.wrong(), piece.judged(), drawing)));
            for (List<Mark> calls : piece.calls()) {
                long wrong = calls.stream().filter(Mark::isWrong).count();
                long judged =
                        calls.stream().filter(mark -> mark != Mark.NOT_JUDGED).count();
                row.add(judged == 0 ? "–" : count(wrong, judged, drawing));
            }
            rows.add(row);
        }
        return rows;
    }

    static String state(Piece piece, Drawing drawing) {
        return drawing.text(piece.isDefective() ? "plot.ladder.defective" : "plot.ladder.good");
    }

    static String count(long wrong, long judged, Drawing drawing) {
        return drawing.text("plot.ladder.count", wrong, judged);
    }
}
