package org.levelgaze.register;

import java.time.Clock;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.levelgaze.journal.Act;
import org.levelgaze.journal.Actor;
import org.levelgaze.journal.Journal;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** The people and cameras of a site. */
@Service
public class Appraisers {

    private final AppraiserRows rows;
    private final Journal journal;
    private final Clock clock;

    Appraisers(AppraiserRows rows, Journal journal, Clock clock) {
        this.rows = rows;
        this.journal = journal;
        this.clock = clock;
    }

    /**
     * Enters a person or a camera.
     *
     * @throws Refusal when the code is taken, or code or name cannot be used
     */
    @Transactional
    public Appraiser create(Actor actor, String code, String name, AppraiserKind kind) {
        Codes.check("appraiser", code);
        Codes.checkName(name);
        if (byCode(actor.site(), code).isPresent()) {
            throw new Refusal(Refusal.Kind.CONFLICT, "appraiser-exists", code);
        }
        long id = rows.insert(actor.site(), code, name, kind, clock.instant());
        Appraiser created = new Appraiser(actor.site(), id, code, name, kind, List.of());
        journal.record(actor, Act.of("appraiser.created", "appraiser:" + created.id(), created.toString()));
        return created;
    }

    /**
     * Enters what a camera judges with from an instant on.
     *
     * @return the camera as it is now
     * @throws Refusal when there is no such appraiser, it is a person, the label is taken or cannot be used, or the
     *     instant lies ahead
     */
    @Transactional
    public Appraiser addConfiguration(Actor actor, String code, String label, Instant changedAt, String note) {
        Appraiser camera = byCode(actor.site(), code)
                .orElseThrow(() -> new Refusal(Refusal.Kind.NOT_FOUND, "unknown-appraiser", code));
        Instant now = clock.instant();
        Codes.checkName(label);
        if (camera.kind() != AppraiserKind.CAMERA) {
            throw new Refusal(Refusal.Kind.INVALID, "person-has-no-configuration", code);
        }
        if (changedAt.isAfter(now)) {
            throw new Refusal(Refusal.Kind.INVALID, "change-lies-ahead", changedAt.toString());
        }
        if (camera.configuration(label).isPresent()) {
            throw new Refusal(Refusal.Kind.CONFLICT, "configuration-exists", label, code);
        }
        rows.insertConfiguration(actor.site(), camera.id(), label, changedAt, note, now);
        Appraiser changed = get(actor.site(), camera.id());
        journal.record(
                actor,
                Act.of(
                        "camera.configuration-changed",
                        "appraiser:" + changed.id(),
                        changed.configurations().toString()));
        return changed;
    }

    /** The appraiser with this code, if there is one. */
    public Optional<Appraiser> byCode(SiteId site, String code) {
        return rows.byCode(site, code);
    }

    /** All appraisers with exactly this name; several people may share one. */
    public List<Appraiser> byName(SiteId site, String name) {
        return rows.byName(site, name);
    }

    /**
     * The appraiser with this number.
     *
     * @throws IllegalArgumentException when there is none
     */
    public Appraiser get(SiteId site, long id) {
        return rows.byId(site, id).orElseThrow(() -> new IllegalArgumentException("No appraiser has the number " + id));
    }

    /** All appraisers of the site, in the order of their codes. */
    public List<Appraiser> all(SiteId site) {
        return rows.all(site);
    }
}
