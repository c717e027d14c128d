package org.levelgaze.studies;

import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.function.Function;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.Findings;
import org.levelgaze.agreement.Study;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.Appraisers;
import org.levelgaze.sets.EditionPiece;
import org.levelgaze.sets.ReferenceSet;
import org.levelgaze.sets.ReferenceSets;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** Stored studies and what they show. */
@Service
public class Studies {

    private final StudyRows rows;
    private final StoredCalls calls;
    private final FindingRows findings;
    private final Conclusions conclusions;
    private final ReferenceSets sets;
    private final Appraisers appraisers;

    Studies(
            StudyRows rows,
            StoredCalls calls,
            FindingRows findings,
            Conclusions conclusions,
            ReferenceSets sets,
            Appraisers appraisers) {
        this.rows = rows;
        this.calls = calls;
        this.findings = findings;
        this.conclusions = conclusions;
        this.sets = sets;
        this.appraisers = appraisers;
    }

    /**
     * The study with this number.
     *
     * @throws Refusal when there is none
     */
    public StudyHead get(SiteId site, long id) {
        return rows.byId(site, id)
                .orElseThrow(() -> new Refusal(Refusal.Kind.NOT_FOUND, "unknown-study", Long.toString(id)));
    }

    /** A page of studies, the latest day first. */
    public List<StudyHead> page(SiteId site, StudyFilter filter, int offset, int limit) {
        return rows.page(site, filter, offset, limit);
    }

    /** The studies behind a mark in the list. */
    List<StudyHead> after(SiteId site, StudyFilter filter, StudyCursor cursor, int limit) {
        return rows.after(site, filter, cursor, limit);
    }

    /** How many studies the filter lets through. */
    public int count(SiteId site, StudyFilter filter) {
        return rows.count(site, filter);
    }

    /** What a concluded study shows; empty before its conclusion. */
    public Optional<Findings> findings(StudyHead study) {
        return findings.newest(study.site(), study.id()).map(stored -> FindingsJson.read(stored.json()));
    }

    /** The same as JSON, to the letter as it was stored. */
    public Optional<String> findingsJson(StudyHead study) {
        return findings.newest(study.site(), study.id()).map(FindingRows.StoredFinding::json);
    }

    /** What the studies showed of one appraiser, the earliest first. */
    public List<Figure> figures(SiteId site, long appraiserId, @Nullable Long taskId) {
        return findings.figures(site, appraiserId, taskId);
    }

    /** What these studies showed of each appraiser who took part; studies without findings are left out. */
    public List<AppraiserFigure> figuresOf(SiteId site, List<StudyHead> page) {
        return findings.figuresOf(site, page.stream().map(StudyHead::id).toList());
    }

    /** The newest study's figure of each appraiser who has one. */
    public List<AppraiserFigure> newestFigures(SiteId site) {
        return findings.newestFigures(site);
    }

    /**
     * Concludes a study that was stored open.
     *
     * @throws Refusal when it is concluded already
     */
    @Transactional
    public void conclude(Actor actor, StudyHead study) {
        if (study.concluded()) {
            throw new Refusal(Refusal.Kind.CONFLICT, "study-concluded-already", Long.toString(study.id()));
        }
        conclusions.conclude(actor, study, forEngine(study));
    }

    /** The study as the engine takes it, from the store; for computing, never for showing to an appraiser. */
    public Study forEngine(StudyHead study) {
        return calls.read(study, pieces(study), codes(study));
    }

    /** How many calls are really stored. */
    long storedCalls(StudyHead study) {
        return calls.count(study);
    }

    /** The pieces that the study names, with what its edition says of them; shown only to whose reading of the key was recorded. */
    public List<StudyPiece> pieces(StudyHead study) {
        ReferenceSet set = sets.get(study.site(), study.setId());
        Map<Long, EditionPiece> edition = sets.piecesForScoring(set, study.edition()).stream()
                .collect(Collectors.toMap(EditionPiece::id, Function.identity()));
        List<Long> ids = rows.pieceIds(study);
        return IntStream.range(0, ids.size())
                .mapToObj(number -> piece(number, Objects.requireNonNull(edition.get(ids.get(number)))))
                .toList();
    }

    private static StudyPiece piece(int number, EditionPiece piece) {
        return new StudyPiece(number, piece.id(), piece.label(), piece.trueState(), piece.defectKind());
    }

    /**
     * Shows every stored call with its true state, those on grey pieces included: only for somebody whose reading of the
     * answer key was recorded.
     */
    public void forEachCall(StudyHead study, Consumer<StoredCall> visitor) {
        List<StudyPiece> pieces = pieces(study);
        List<String> codes = codes(study);
        List<String> seen = calls.seenKinds(study.site(), study.id());
        calls.forEach(study, (piece, appraiser, trial, accepted, kind) -> {
            StudyPiece judged = pieces.get(piece);
            visitor.accept(new StoredCall(
                    piece,
                    judged.label(),
                    judged.trueState(),
                    judged.defectKind(),
                    appraiser,
                    codes.get(appraiser),
                    trial,
                    accepted,
                    kind < 0 ? null : seen.get(kind)));
        });
    }

    /** Whether any call of the study names a kind of defect. */
    public boolean namesKinds(StudyHead study) {
        return !calls.seenKinds(study.site(), study.id()).isEmpty();
    }

    /** The appraisers' codes in the order of the study. */
    List<String> codes(StudyHead study) {
        return study.appraisers().stream()
                .map(one -> appraisers.get(study.site(), one.appraiserId()).code())
                .toList();
    }
}
