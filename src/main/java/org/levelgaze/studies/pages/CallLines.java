package org.levelgaze.studies.pages;

import java.util.ArrayList;
import java.util.BitSet;
import java.util.List;
import java.util.function.Consumer;
import org.jspecify.annotations.Nullable;
import org.levelgaze.sets.TrueState;
import org.levelgaze.studies.SafeCell;
import org.levelgaze.studies.StoredCall;
import org.levelgaze.studies.Studies;
import org.levelgaze.studies.StudyHead;
import org.levelgaze.studies.StudyPiece;
import org.springframework.stereotype.Component;

/** The calls of a study as lines of a file that can be imported again. Every cell is safe for a spreadsheet. */
@Component
class CallLines {

    private static final List<String> PLAIN = List.of("piece", "reference", "appraiser", "trial", "call");
    private static final List<String> WITH_KINDS =
            List.of("piece", "reference", "appraiser", "trial", "call", "defect", "seen");

    private final Studies studies;
    private final Headings headings;

    CallLines(Studies studies, Headings headings) {
        this.studies = studies;
        this.headings = headings;
    }

    /**
     * Gives the head, then one line per call. A piece or an appraiser without any call stands on a line with an empty
     * call, so that nothing of the study is lost.
     */
    void forEach(StudyHead study, Consumer<List<String>> line) {
        List<StudyPiece> pieces = studies.pieces(study);
        boolean kinds = studies.namesKinds(study) || pieces.stream().anyMatch(piece -> piece.defectKind() != null);
        List<String> codes = headings.of(study).taking().stream()
                .map(one -> one.appraiser().code())
                .toList();
        BitSet judged = new BitSet();
        BitSet judging = new BitSet();
        line.accept(kinds ? WITH_KINDS : PLAIN);
        studies.forEachCall(study, call -> {
            judged.set(call.pieceNumber());
            judging.set(call.appraiserNumber());
            line.accept(line(call, kinds));
        });
        for (StudyPiece piece : pieces) {
            if (!judged.get(piece.number())) {
                line.accept(without(piece, codes.get(0), kinds));
            }
        }
        for (int who = 0; who < codes.size(); who++) {
            if (!judging.get(who)) {
                line.accept(without(pieces.get(0), codes.get(who), kinds));
            }
        }
    }

    private static List<String> line(StoredCall call, boolean kinds) {
        return cells(
                kinds,
                call.piece(),
                call.trueState(),
                call.appraiser(),
                call.trial(),
                call.accepted() ? "accept" : "reject",
                call.defectKind(),
                call.seenKind());
    }

    private static List<String> without(StudyPiece piece, String appraiser, boolean kinds) {
        return cells(kinds, piece.label(), piece.trueState(), appraiser, 1, "", piece.defectKind(), null);
    }

    private static List<String> cells(
            boolean kinds,
            String piece,
            TrueState state,
            String appraiser,
            int trial,
            String call,
            @Nullable String defect,
            @Nullable String seen) {
        List<String> cells = new ArrayList<>(
                List.of(SafeCell.of(piece), state.word(), SafeCell.of(appraiser), Integer.toString(trial), call));
        if (kinds) {
            cells.add(SafeCell.of(defect == null ? "" : defect));
            cells.add(SafeCell.of(seen == null ? "" : seen));
        }
        return cells;
    }
}
