package org.levelgaze.studies.reading;

import java.util.List;
import java.util.function.Function;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.Call;
import org.levelgaze.agreement.Piece;
import org.levelgaze.agreement.Study;
import org.levelgaze.agreement.StudyBuilder;

/**
 * The calls of one file, every row of which could be taken. Pieces, appraisers and defect kinds are known by their place
 * in the order of first appearance, from 0; calls stand in the order of the file.
 */
public final class RecordedCalls {

    private final List<RecordedPiece> pieces;
    private final List<String> appraisers;
    private final List<String> kinds;
    private final CallColumns calls;
    private final FileFacts facts;

    RecordedCalls(
            List<RecordedPiece> pieces,
            List<String> appraisers,
            List<String> kinds,
            CallColumns calls,
            FileFacts facts) {
        this.pieces = List.copyOf(pieces);
        this.appraisers = List.copyOf(appraisers);
        this.kinds = List.copyOf(kinds);
        this.calls = calls;
        this.facts = facts;
    }

    /** The pieces in order, those without a call included. */
    public List<RecordedPiece> pieces() {
        return pieces;
    }

    /** The appraisers in order, those without a call included. */
    public List<String> appraisers() {
        return appraisers;
    }

    /** The defect kinds, true or seen, in order. */
    public List<String> kinds() {
        return kinds;
    }

    /** How many calls were made. */
    public int calls() {
        return calls.size();
    }

    /** The highest trial number with a call, 0 when there is no call. */
    public int trials() {
        return calls.highestTrial();
    }

    /** Calls that the file leaves empty. */
    public long emptyCalls() {
        return facts.emptyCalls();
    }

    /** Rows below the header, empty lines apart. */
    public long rows() {
        return facts.rows();
    }

    /** Bytes of the file. */
    public long bytes() {
        return facts.bytes();
    }

    /** SHA-256 of the file's bytes, 64 hexadecimal digits. */
    public String sha256() {
        return facts.sha256();
    }

    /** Whether the file says what its pieces really are. It then does for all of them. */
    public boolean hasTruths() {
        return !pieces.isEmpty() && pieces.get(0).truthSaid();
    }

    /** Shows every call to the visitor, in the order of the file. */
    public void forEachCall(Study.CallVisitor visitor) {
        calls.forEach(visitor);
    }

    /**
     * The study with the true states of the file.
     *
     * @throws IllegalStateException when the file has none
     */
    public Study toStudy() {
        if (!hasTruths()) {
            throw new IllegalStateException("The file does not say what its pieces really are");
        }
        return study(pieces.stream().map(RecordedCalls::piece).toList(), appraisers);
    }

    /**
     * The study with true states known from elsewhere.
     *
     * @param known by label: the piece with its true state, or {@code null} when it is undecided; such a piece is not
     *     scored, and its calls are left out
     */
    public Study toStudy(Function<String, @Nullable Piece> known) {
        return study(pieces.stream().map(piece -> known.apply(piece.label())).toList(), appraisers);
    }

    /**
     * The study with true states and codes known from elsewhere.
     *
     * @param truths by place: the piece with its true state, or {@code null} when it is undecided; such a piece is not scored
     * @param codes by place: the code of the appraiser whom the file's word means
     */
    public Study toStudy(List<@Nullable Piece> truths, List<String> codes) {
        return study(truths, codes);
    }

    private static @Nullable Piece piece(RecordedPiece piece) {
        return piece.truth() == null ? null : new Piece(piece.label(), piece.truth(), piece.defectKind());
    }

    private Study study(List<@Nullable Piece> truths, List<String> codes) {
        StudyBuilder builder = Study.builder(calls.size());
        int[] places = new int[truths.size()];
        for (int at = 0; at < places.length; at++) {
            Piece piece = truths.get(at);
            places[at] = piece == null ? -1 : builder.piece(piece.label(), piece.truth(), piece.defectKind());
        }
        codes.forEach(builder::appraiser);
        int[] seenKinds = kinds.stream().mapToInt(builder::kind).toArray();
        calls.forEach((int piece, int appraiser, int trial, Call call, int seen) -> {
            if (places[piece] >= 0) {
                int kind = seen == Study.NO_KIND ? Study.NO_KIND : seenKinds[seen];
                builder.call(places[piece], appraiser, trial, call, kind);
            }
        });
        return builder.build();
    }
}
