package org.levelgaze.studies;

import java.sql.Connection;
import java.sql.SQLException;
import java.time.Clock;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.concurrent.CancellationException;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.Piece;
import org.levelgaze.agreement.Study;
import org.levelgaze.journal.Act;
import org.levelgaze.journal.Actor;
import org.levelgaze.journal.Journal;
import org.levelgaze.register.Appraiser;
import org.levelgaze.sets.Edition;
import org.levelgaze.sets.ReferenceSet;
import org.levelgaze.sets.ReferenceSets;
import org.levelgaze.shared.Refusal;
import org.levelgaze.studies.reading.RecordedCalls;
import org.levelgaze.studies.reading.Watcher;
import org.springframework.dao.DuplicateKeyException;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.stereotype.Component;

/** Writes a study whose every part is known: head, pieces, calls, findings. Part of the caller's transaction. */
@Component
class StudyWriter {

    private static final int WATCHED_EVERY = 1 << 14;

    private final StudyRows rows;
    private final ReferenceSets sets;
    private final Conclusions conclusions;
    private final Journal journal;
    private final JdbcTemplate jdbc;
    private final Clock clock;

    StudyWriter(
            StudyRows rows,
            ReferenceSets sets,
            Conclusions conclusions,
            Journal journal,
            JdbcTemplate jdbc,
            Clock clock) {
        this.rows = rows;
        this.sets = sets;
        this.conclusions = conclusions;
        this.journal = journal;
        this.jdbc = jdbc;
        this.clock = clock;
    }

    /** The study that these bytes already made for this set and day; null: none. */
    @Nullable
    Long sameBytes(ReferenceSet set, LocalDate performedOn, String sha256) {
        return rows.sameBytes(set, performedOn, HexFormat.of().parseHex(sha256));
    }

    StudyHead write(
            Actor actor,
            StudyRequest request,
            ReferenceSet set,
            List<Appraiser> taking,
            Map<Long, Integer> configurations,
            RecordedCalls calls,
            Watcher watcher) {
        Edition edition = sets.newest(set);
        List<StudyPiece> pieces =
                new PieceMatch(set.code(), sets.piecesForScoring(set, edition.number())).match(calls.pieces());
        StudyHead head = head(request, set, edition, participants(taking, configurations, calls), calls);
        insertHead(actor, head, request.consent(), calls.sha256());
        rows.insertPieces(
                head.site(),
                head.id(),
                pieces.stream().mapToLong(StudyPiece::pieceId).toArray());
        rows.insertSeenKinds(head.site(), head.id(), calls.kinds());
        copy(head, calls, watcher);
        if (calls.hasTruths()) {
            sets.noteKeySeen(actor, set, edition.number(), "a file of calls with true states");
        }
        journal.record(actor, Act.of("study.imported", "study:" + head.id(), calls.sha256() + " " + head));
        if (request.conclude()) {
            conclusions.conclude(actor, head, forEngine(calls, pieces, taking));
        }
        return head;
    }

    private StudyHead head(
            StudyRequest request,
            ReferenceSet set,
            Edition edition,
            List<StudyHead.Participant> participants,
            RecordedCalls calls) {
        long planned = participants.stream()
                .mapToLong(one -> (long) one.trials() * calls.pieces().size())
                .sum();
        return new StudyHead(
                set.site(),
                rows.nextId(),
                set.taskId(),
                set.id(),
                edition.number(),
                request.performedOn(),
                request.fileName(),
                calls.pieces().size(),
                calls.calls(),
                planned - calls.calls(),
                clock.instant(),
                null,
                participants);
    }

    private static List<StudyHead.Participant> participants(
            List<Appraiser> taking, Map<Long, Integer> configurations, RecordedCalls calls) {
        int[] trials = new int[taking.size()];
        calls.forEachCall(
                (piece, appraiser, trial, call, seen) -> trials[appraiser] = Math.max(trials[appraiser], trial));
        List<StudyHead.Participant> participants = new ArrayList<>();
        for (int i = 0; i < trials.length; i++) {
            long id = taking.get(i).id();
            participants.add(new StudyHead.Participant(i, id, configurations.get(id), trials[i]));
        }
        return participants;
    }

    private void insertHead(Actor actor, StudyHead head, Consent consent, String sha256) {
        byte[] digest = HexFormat.of().parseHex(sha256);
        int repeat = consent.repeat() ? rows.repeats(head, digest) : 0;
        try {
            rows.insert(head, digest, repeat, actor.who());
        } catch (DuplicateKeyException e) {
            throw new Refusal(
                    Refusal.Kind.CONFLICT, "duplicate-study", head.performedOn().toString());
        }
    }

    private void copy(StudyHead head, RecordedCalls calls, Watcher watcher) {
        jdbc.execute((Connection connection) -> {
            long stored = copy(connection, head, calls, watcher);
            if (stored != calls.calls()) {
                throw new SQLException(calls.calls() + " calls were sent and " + stored + " were stored");
            }
            return stored;
        });
    }

    private static long copy(Connection connection, StudyHead head, RecordedCalls calls, Watcher watcher)
            throws SQLException {
        long[] sent = {0};
        try (CallCopy copy = CallCopy.start(connection, head.site(), head.id())) {
            calls.forEachCall((piece, appraiser, trial, call, seen) -> {
                copy.add(appraiser, piece, trial, seen, call == org.levelgaze.agreement.Call.ACCEPT);
                if (++sent[0] % WATCHED_EVERY == 0 && !watcher.goesOn(sent[0], calls.bytes())) {
                    throw new CancellationException("Stopped after " + sent[0] + " calls");
                }
            });
            return copy.finish();
        }
    }

    private static Study forEngine(RecordedCalls calls, List<StudyPiece> pieces, List<Appraiser> taking) {
        List<String> codes = taking.stream().map(Appraiser::code).toList();
        List<@Nullable Piece> scored = pieces.stream().map(StudyWriter::scored).toList();
        return calls.toStudy(scored, codes);
    }

    private static @Nullable Piece scored(StudyPiece piece) {
        org.levelgaze.agreement.TrueState truth = piece.scoredAs();
        return truth == null ? null : new Piece(piece.label(), truth, piece.defectKind());
    }
}
