package org.levelgaze.sets;

import java.time.Clock;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import org.levelgaze.journal.Act;
import org.levelgaze.journal.Actor;
import org.levelgaze.journal.Journal;
import org.levelgaze.register.Task;
import org.levelgaze.shared.CodeRule;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.levelgaze.shared.Sites;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** The reference sets of a site and their editions. */
@Service
public class ReferenceSets {

    private final SetRows rows;
    private final Journal journal;
    private final Sites sites;
    private final Clock clock;

    ReferenceSets(SetRows rows, Journal journal, Sites sites, Clock clock) {
        this.rows = rows;
        this.journal = journal;
        this.sites = sites;
        this.clock = clock;
    }

    /**
     * Enters a set with its first edition.
     *
     * @throws Refusal when the code is taken or cannot be used, the decision lies ahead, or a defect kind is not the
     *     task's
     */
    @Transactional
    public ReferenceSet create(Actor actor, Task task, NewSet set) {
        checkCode(actor.site(), set.code());
        checkDay(actor.site(), set);
        checkKinds(task, set);
        ReferenceSet created = rows.insertSet(actor.site(), task.id(), set.code(), set.basis(), clock.instant());
        rows.insertFirstEdition(created, set, actor.who(), clock.instant());
        journal.record(actor, Act.of("set.created", "set:" + created.id(), set.summary()));
        return created;
    }

    /** The set with this code, if there is one. */
    public Optional<ReferenceSet> byCode(SiteId site, String code) {
        return rows.setByCode(site, code);
    }

    /**
     * The set with this number.
     *
     * @throws IllegalArgumentException when there is none
     */
    public ReferenceSet get(SiteId site, long id) {
        return rows.setById(site, id).orElseThrow(() -> new IllegalArgumentException("No set has the number " + id));
    }

    /** All sets of the site, in the order of their codes. */
    public List<ReferenceSet> all(SiteId site) {
        return rows.sets(site);
    }

    /** All editions of a set, the newest first. */
    public List<Edition> editions(ReferenceSet set) {
        return rows.editions(set);
    }

    /** The edition that stands now. */
    public Edition newest(ReferenceSet set) {
        return rows.editions(set).get(0);
    }

    /**
     * The pieces of an edition with their true states, for computing. Whoever shows them to somebody, piece by piece,
     * calls {@link #readKey} instead.
     */
    public List<EditionPiece> piecesForScoring(ReferenceSet set, int edition) {
        return rows.pieces(set, edition);
    }

    /**
     * The pieces of an edition with their true states, about to be shown. Whoever asks has seen the answer key; the
     * first time is recorded and journalled.
     *
     * @param page where they are shown
     */
    @Transactional
    public List<EditionPiece> readKey(Actor actor, ReferenceSet set, int edition, String page) {
        noteKeySeen(actor, set, edition, page);
        return rows.pieces(set, edition);
    }

    /** Whether this reading would not be the first of whoever asks. */
    public boolean hasReadKey(Actor actor, ReferenceSet set, int edition) {
        return keyReadings(set, edition).stream()
                .anyMatch(reading -> reading.who().equals(actor.who()));
    }

    /**
     * Records that somebody has seen the answer key, as with a file that holds it. Only the first time counts and is
     * journalled.
     *
     * @param where on which page or in what
     */
    @Transactional
    public void noteKeySeen(Actor actor, ReferenceSet set, int edition, String where) {
        if (rows.recordKeyReading(set, edition, actor.who(), where, clock.instant())) {
            String subject = "set:" + set.id() + "/" + edition;
            journal.record(actor, Act.of("answer-key.read", subject, where));
        }
    }

    /** Who has seen the answer key of an edition, in the order of the first reading. */
    public List<KeyReading> keyReadings(ReferenceSet set, int edition) {
        return rows.keyReadings(set, edition);
    }

    private void checkCode(SiteId site, String code) {
        if (!CodeRule.isUsable(code)) {
            throw new Refusal(Refusal.Kind.INVALID, "set-code-not-usable", code, CodeRule.LONGEST);
        }
        if (rows.setByCode(site, code).isPresent()) {
            throw new Refusal(Refusal.Kind.CONFLICT, "set-exists", code);
        }
    }

    private void checkDay(SiteId site, NewSet set) {
        LocalDate today = sites.today(site);
        if (set.decidedOn().isAfter(today)) {
            throw new Refusal(
                    Refusal.Kind.INVALID, "decision-lies-ahead", set.decidedOn().toString(), today.toString());
        }
    }

    private static void checkKinds(Task task, NewSet set) {
        for (NewPiece piece : set.pieces()) {
            String kind = piece.defectKind();
            if (kind != null && task.defectKind(kind).isEmpty()) {
                throw new Refusal(Refusal.Kind.INVALID, "unknown-defect-kind", kind, piece.label(), task.code());
            }
        }
    }
}
