package org.levelgaze.studies;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Consumer;
import org.jspecify.annotations.Nullable;
import org.levelgaze.sets.EditionPiece;
import org.levelgaze.sets.TrueState;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.RowError;
import org.levelgaze.studies.reading.RecordedPiece;

/** Holds the pieces of a file against those of an edition: unknown pieces and disagreeing true states are named. */
final class PieceMatch {

    private static final int KEPT = 200;

    private final Map<String, EditionPiece> edition = new HashMap<>();
    private final List<RowError> bad = new ArrayList<>();
    private final String set;
    private final Consumer<RowError> sink;
    private long count;

    PieceMatch(String set, List<EditionPiece> pieces) {
        this(set, pieces, error -> {});
    }

    /** Hands every bad row on as it is found. */
    PieceMatch(String set, List<EditionPiece> pieces, Consumer<RowError> sink) {
        this.set = set;
        this.sink = sink;
        pieces.forEach(piece -> edition.put(piece.label(), piece));
    }

    /**
     * The file's pieces as the edition knows them.
     *
     * @throws Refusal with every bad row when one is unknown or its true state disagrees
     */
    List<StudyPiece> match(List<RecordedPiece> pieces) {
        List<StudyPiece> matched = compare(pieces);
        if (count > 0) {
            throw new Refusal(Refusal.Kind.INVALID, "file-does-not-fit-set", List.of(set, count), bad, count);
        }
        return matched;
    }

    /** Hands every bad row to the sink and refuses nothing. */
    void misfits(List<RecordedPiece> pieces) {
        compare(pieces);
    }

    private List<StudyPiece> compare(List<RecordedPiece> pieces) {
        List<StudyPiece> matched = new ArrayList<>();
        for (RecordedPiece piece : pieces) {
            EditionPiece known = edition.get(piece.label());
            if (known == null) {
                bad(piece, "piece", piece.label(), "studies.row.piece-unknown", piece.label(), set);
            } else {
                compare(piece, known);
                matched.add(new StudyPiece(
                        matched.size(), known.id(), known.label(), known.trueState(), known.defectKind()));
            }
        }
        return matched;
    }

    private void compare(RecordedPiece piece, EditionPiece known) {
        TrueState said = piece.isGrey() ? TrueState.GREY : decided(piece.truth());
        if (said != null && said != known.trueState()) {
            bad(piece, "reference", said.word(), "studies.row.truth-disagrees", piece.label(), set);
        }
    }

    static @Nullable TrueState decided(org.levelgaze.agreement.@Nullable TrueState truth) {
        if (truth == null) {
            return null;
        }
        return switch (truth) {
            case GOOD -> TrueState.GOOD;
            case DEFECTIVE -> TrueState.DEFECTIVE;
        };
    }

    private void bad(RecordedPiece piece, String column, String value, String message, Object... arguments) {
        count++;
        RowError error = new RowError(piece.row(), column, value, message, List.of(arguments));
        sink.accept(error);
        if (bad.size() < KEPT) {
            bad.add(error);
        }
    }
}
