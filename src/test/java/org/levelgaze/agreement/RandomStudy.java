package org.levelgaze.agreement;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import org.jspecify.annotations.Nullable;

/**
 * A study as plain rows, for tests: whatever shape, calls missing, the order of rows at random.
 *
 * @param pieces the pieces
 * @param appraisers the appraisers' codes
 * @param rows the calls
 */
record RandomStudy(List<Piece> pieces, List<String> appraisers, List<Row> rows) {

    /** One call. */
    record Row(
            int piece,
            int appraiser,
            int trial,
            Call call,
            @Nullable String seen) {}

    private static final List<String> KINDS = List.of("chip", "crack", "stain");

    /** A study that the seed decides: 0 to 12 pieces, 1 to 4 appraisers, up to 5 trials each. */
    static RandomStudy of(long seed) {
        Random random = new Random(seed);
        double defectiveShare = random.nextInt(4) / 3.0;
        boolean withKinds = random.nextBoolean();
        List<Piece> pieces = new ArrayList<>();
        int count = random.nextInt(13);
        for (int at = 0; at < count; at++) {
            boolean defective = random.nextDouble() < defectiveShare;
            String kind = withKinds && defective ? KINDS.get(random.nextInt(2)) : null;
            pieces.add(new Piece("P" + at, defective ? TrueState.DEFECTIVE : TrueState.GOOD, kind));
        }
        List<String> appraisers = new ArrayList<>();
        List<Row> rows = new ArrayList<>();
        int people = 1 + random.nextInt(4);
        for (int appraiser = 0; appraiser < people; appraiser++) {
            appraisers.add("A" + appraiser);
            addCalls(rows, pieces, appraiser, random);
        }
        Collections.shuffle(rows, random);
        return new RandomStudy(pieces, appraisers, rows);
    }

    private static void addCalls(List<Row> rows, List<Piece> pieces, int appraiser, Random random) {
        int trials = random.nextInt(6);
        double missing = random.nextInt(3) / 4.0;
        double wrong = random.nextInt(4) / 6.0;
        for (int piece = 0; piece < pieces.size(); piece++) {
            for (int trial = 1; trial <= trials; trial++) {
                if (random.nextDouble() >= missing) {
                    boolean reject = (pieces.get(piece).truth() == TrueState.DEFECTIVE) ^ (random.nextDouble() < wrong);
                    String seen = reject && random.nextBoolean() ? KINDS.get(random.nextInt(3)) : null;
                    rows.add(new Row(piece, appraiser, trial, reject ? Call.REJECT : Call.ACCEPT, seen));
                }
            }
        }
    }

    Study study() {
        StudyBuilder study = Study.builder(rows.size());
        pieces.forEach(piece -> study.piece(piece.label(), piece.truth(), piece.defectKind()));
        appraisers.forEach(study::appraiser);
        rows.forEach(row -> study.call(row.piece(), row.appraiser(), row.trial(), row.call(), row.seen()));
        return study.build();
    }

    Findings findings() {
        return Engine.assess(study(), Terms.STANDARD);
    }

    /** Accept and reject, good and defective, all exchanged. */
    RandomStudy mirrored() {
        List<Piece> otherPieces = pieces.stream()
                .map(piece -> new Piece(
                        piece.label(),
                        piece.truth() == TrueState.GOOD ? TrueState.DEFECTIVE : TrueState.GOOD,
                        piece.defectKind()))
                .toList();
        List<Row> otherRows = rows.stream()
                .map(row -> new Row(
                        row.piece(),
                        row.appraiser(),
                        row.trial(),
                        row.call() == Call.ACCEPT ? Call.REJECT : Call.ACCEPT,
                        row.seen()))
                .toList();
        return new RandomStudy(otherPieces, appraisers, otherRows);
    }

    /** The same pieces and appraisers in another order and under other names. */
    RandomStudy renamed(long seed) {
        Random random = new Random(seed);
        List<Integer> pieceOrder = order(pieces.size(), random);
        List<Integer> appraiserOrder = order(appraisers.size(), random);
        List<Piece> otherPieces = pieceOrder.stream()
                .map(place -> pieces.get(place))
                .map(piece -> new Piece("ж" + piece.label(), piece.truth(), piece.defectKind()))
                .toList();
        List<String> otherAppraisers = appraiserOrder.stream()
                .map(place -> "ü" + appraisers.get(place))
                .toList();
        List<Row> otherRows = new ArrayList<>(rows.stream()
                .map(row -> new Row(
                        pieceOrder.indexOf(row.piece()),
                        appraiserOrder.indexOf(row.appraiser()),
                        row.trial(),
                        row.call(),
                        row.seen()))
                .toList());
        Collections.shuffle(otherRows, random);
        return new RandomStudy(otherPieces, otherAppraisers, otherRows);
    }

    private static List<Integer> order(int size, Random random) {
        List<Integer> order = new ArrayList<>();
        for (int at = 0; at < size; at++) {
            order.add(at);
        }
        Collections.shuffle(order, random);
        return order;
    }
}
