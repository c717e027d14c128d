package org.levelgaze.studies;

import java.time.LocalDate;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.Consumer;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.Appraiser;
import org.levelgaze.register.Task;
import org.levelgaze.register.Tasks;
import org.levelgaze.sets.Basis;
import org.levelgaze.sets.EditionPiece;
import org.levelgaze.sets.NewPiece;
import org.levelgaze.sets.NewSet;
import org.levelgaze.sets.ReferenceSet;
import org.levelgaze.sets.ReferenceSets;
import org.levelgaze.sets.TrueState;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.RowError;
import org.levelgaze.shared.SiteId;
import org.levelgaze.shared.Sites;
import org.levelgaze.studies.reading.RecordedCalls;
import org.levelgaze.studies.reading.RecordedPiece;
import org.levelgaze.studies.reading.Watcher;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** Takes a file of calls into the store: everything it brings, or nothing. */
@Service
public class StudyImport {

    private final Tasks tasks;
    private final ReferenceSets sets;
    private final Sites sites;
    private final Participants participants;
    private final StudyWriter writer;

    StudyImport(Tasks tasks, ReferenceSets sets, Sites sites, Participants participants, StudyWriter writer) {
        this.tasks = tasks;
        this.sets = sets;
        this.sites = sites;
        this.participants = participants;
        this.writer = writer;
    }

    /**
     * Stores a study and, when asked to, concludes it.
     *
     * @param actor who brings it
     * @param request what the file is said to be
     * @param calls what stands in it
     * @param watcher told how many calls are stored, and may stop it
     * @return what was stored, or what must be said yes to first
     * @throws Refusal when it cannot be a study; nothing was stored
     * @throws java.util.concurrent.CancellationException when the watcher stops it; nothing was stored
     */
    @Transactional
    public ImportOutcome take(Actor actor, StudyRequest request, RecordedCalls calls, Watcher watcher) {
        SiteId site = actor.site();
        Task task = tasks.byCode(site, request.task())
                .orElseThrow(() -> new Refusal(Refusal.Kind.INVALID, "unknown-task", request.task()));
        refuseDayAhead(site, request.performedOn());
        refuseNoCalls(calls);
        Optional<ReferenceSet> set = knownSet(site, task, request.set());
        Map<String, Appraiser> known = participants.known(site, calls.appraisers());
        ImportOutcome.Asked asked = questions(request, calls, task, set, known);
        if (asked.anything()) {
            return asked;
        }
        List<Appraiser> taking = participants.enter(actor, calls.appraisers(), known, request.consent());
        Map<Long, Integer> configurations =
                participants.configurations(site, taking, request.configuration(), request.performedOn());
        ReferenceSet used = set.orElseGet(() -> makeSet(actor, task, request, calls));
        return new ImportOutcome.Stored(writer.write(actor, request, used, taking, configurations, calls, watcher));
    }

    /**
     * Names every piece of a file that does not fit a known set, also those beyond the first that a refusal lists. What
     * it names tells true states apart, so it is for those who may see them.
     *
     * @param set the set's code; an unknown one takes any piece
     * @param calls what stands in the file
     * @param badRows given every row, in the order of the pieces
     */
    public void findMisfits(SiteId site, String set, RecordedCalls calls, Consumer<RowError> badRows) {
        sets.byCode(site, set).ifPresent(known -> {
            List<EditionPiece> pieces =
                    sets.piecesForScoring(known, sets.newest(known).number());
            new PieceMatch(set, pieces, badRows).misfits(calls.pieces());
        });
    }

    private void refuseDayAhead(SiteId site, LocalDate performedOn) {
        LocalDate today = sites.today(site);
        if (performedOn.isAfter(today)) {
            throw new Refusal(Refusal.Kind.INVALID, "study-lies-ahead", performedOn.toString(), today.toString());
        }
    }

    private static void refuseNoCalls(RecordedCalls calls) {
        if (calls.calls() == 0) {
            throw new Refusal(Refusal.Kind.INVALID, "file-without-calls", calls.rows());
        }
    }

    private Optional<ReferenceSet> knownSet(SiteId site, Task task, String code) {
        Optional<ReferenceSet> set = sets.byCode(site, code);
        set.filter(found -> found.taskId() != task.id()).ifPresent(found -> {
            String owner = tasks.get(site, found.taskId()).code();
            throw new Refusal(Refusal.Kind.INVALID, "set-of-another-task", code, owner, task.code());
        });
        return set;
    }

    private ImportOutcome.Asked questions(
            StudyRequest request,
            RecordedCalls calls,
            Task task,
            Optional<ReferenceSet> set,
            Map<String, Appraiser> known) {
        Consent consent = request.consent();
        if (set.isEmpty() && !calls.hasTruths()) {
            throw new Refusal(Refusal.Kind.INVALID, "unknown-set-without-truths", request.set());
        }
        List<String> appraisers = calls.appraisers().stream()
                .filter(word ->
                        !known.containsKey(word) && consent.enterAs(word).isEmpty())
                .toList();
        List<String> kinds = set.isPresent() || consent.newKinds() ? List.of() : unknownKinds(task, calls);
        Long duplicate = set.isEmpty() || consent.repeat()
                ? null
                : writer.sameBytes(set.get(), request.performedOn(), calls.sha256());
        return new ImportOutcome.Asked(set.isEmpty() && !consent.newSet(), appraisers, kinds, duplicate);
    }

    private static List<String> unknownKinds(Task task, RecordedCalls calls) {
        Set<String> unknown = new TreeSet<>();
        for (RecordedPiece piece : calls.pieces()) {
            String kind = kindOfDefective(piece);
            if (kind != null && task.defectKind(kind).isEmpty()) {
                unknown.add(kind);
            }
        }
        return List.copyOf(unknown);
    }

    /** A kind written beside a good piece says nothing of it. */
    private static @Nullable String kindOfDefective(RecordedPiece piece) {
        return piece.truth() == org.levelgaze.agreement.TrueState.DEFECTIVE ? piece.defectKind() : null;
    }

    private ReferenceSet makeSet(Actor actor, Task task, StudyRequest request, RecordedCalls calls) {
        Task complete = tasks.addUnrated(actor, task, unknownKinds(task, calls));
        List<NewPiece> pieces = calls.pieces().stream()
                .map(piece -> new NewPiece(piece.label(), state(piece), kindOfDefective(piece), null))
                .toList();
        NewSet made = new NewSet(request.set(), request.performedOn(), "", null, Basis.IMPORT, pieces);
        return sets.create(actor, complete, made);
    }

    private static TrueState state(RecordedPiece piece) {
        TrueState state = PieceMatch.decided(piece.truth());
        return state == null ? TrueState.GREY : state;
    }
}
