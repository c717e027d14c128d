package org.levelgaze.studies.pages;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import org.levelgaze.journal.Actor;
import org.levelgaze.plot.Picture;
import org.levelgaze.plot.PieceLadder;
import org.levelgaze.sets.ReferenceSets;
import org.levelgaze.sets.TrueState;
import org.levelgaze.studies.StoredCall;
import org.levelgaze.studies.Studies;
import org.levelgaze.studies.StudyHead;
import org.levelgaze.studies.StudyPiece;
import org.springframework.stereotype.Component;

/** Who miscalled what in which trial: shows true states, so it opens only after the reading of the key was recorded. */
@Component
class Ladders {

    private final Studies studies;
    private final ReferenceSets sets;
    private final Headings headings;
    private final Languages languages;

    Ladders(Studies studies, ReferenceSets sets, Headings headings, Languages languages) {
        this.studies = studies;
        this.sets = sets;
        this.headings = headings;
        this.languages = languages;
    }

    StudyHeading heading(Actor actor, long id) {
        return headings.of(studies.get(actor.site(), id));
    }

    /** Whether whoever asks has seen the key of the study's edition before. */
    boolean opened(Actor actor, StudyHeading heading) {
        return sets.hasReadKey(actor, heading.set(), heading.study().edition());
    }

    /** Records that whoever asks has seen the key of the study's edition. */
    void open(Actor actor, StudyHeading heading) {
        sets.readKey(
                actor,
                heading.set(),
                heading.study().edition(),
                "/studies/" + heading.study().id() + "/pieces");
    }

    Picture picture(StudyHeading heading, Locale locale) {
        StudyHead study = heading.study();
        List<StudyPiece> pieces = studies.pieces(study);
        List<StudyHeading.Taking> taking = heading.taking();
        List<List<List<PieceLadder.Mark>>> marks = new ArrayList<>();
        for (int piece = 0; piece < pieces.size(); piece++) {
            marks.add(taking.stream().map(Ladders::unjudged).toList());
        }
        studies.forEachCall(
                study,
                call -> marks.get(call.pieceNumber())
                        .get(call.appraiserNumber())
                        .set(call.trial() - 1, mark(call)));
        return PieceLadder.of(
                languages.wording(locale).say("studies.pieces.title"),
                judges(taking),
                rungs(pieces, marks),
                languages.drawing("ladder", locale));
    }

    private static List<PieceLadder.Mark> unjudged(StudyHeading.Taking one) {
        return new ArrayList<>(Collections.nCopies(one.trials(), PieceLadder.Mark.NOT_JUDGED));
    }

    /** Who made no call at all has no place on the ladder. */
    private static List<PieceLadder.Judge> judges(List<StudyHeading.Taking> taking) {
        return taking.stream()
                .filter(one -> one.trials() > 0)
                .map(one -> new PieceLadder.Judge(one.name(), one.trials()))
                .toList();
    }

    /** Undecided pieces are not scored and so cannot be miscalled. */
    private static List<PieceLadder.Piece> rungs(List<StudyPiece> pieces, List<List<List<PieceLadder.Mark>>> marks) {
        List<PieceLadder.Piece> rungs = new ArrayList<>();
        for (StudyPiece piece : pieces) {
            if (piece.trueState() != TrueState.GREY) {
                List<List<PieceLadder.Mark>> calls = marks.get(piece.number()).stream()
                        .filter(trials -> !trials.isEmpty())
                        .toList();
                rungs.add(new PieceLadder.Piece(piece.label(), piece.trueState() == TrueState.DEFECTIVE, calls));
            }
        }
        return rungs;
    }

    private static PieceLadder.Mark mark(StoredCall call) {
        return switch (call.trueState()) {
            case DEFECTIVE -> call.accepted() ? PieceLadder.Mark.FALSE_ACCEPT : PieceLadder.Mark.RIGHT;
            case GOOD -> call.accepted() ? PieceLadder.Mark.RIGHT : PieceLadder.Mark.FALSE_REJECT;
            case GREY -> PieceLadder.Mark.NOT_JUDGED;
        };
    }
}
