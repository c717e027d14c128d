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

    private final AppraiserStore store;
    private final Journal journal;
    private final Clock clock;

    Appraisers(AppraiserStore store, Journal journal, Clock clock) {
        this.store = store;
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
        Appraiser created = store.save(new AppraiserEntity(actor.site(), code, name, kind, clock.instant()))
                .toAppraiser();
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
        AppraiserEntity entity = store.findBySiteIdAndCode(actor.site().value(), code)
                .orElseThrow(() -> new Refusal(Refusal.Kind.NOT_FOUND, "unknown-appraiser", code));
        Appraiser camera = entity.toAppraiser();
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
        entity.addConfiguration(label, changedAt, note, now);
        Appraiser changed = store.save(entity).toAppraiser();
        journal.record(
                actor,
                Act.of(
                        "camera.configuration-changed",
                        "appraiser:" + changed.id(),
                        changed.configurations().toString()));
        return changed;
    }

    /** The appraiser with this code, if there is one. */
    @Transactional(readOnly = true)
    public Optional<Appraiser> byCode(SiteId site, String code) {
        return store.findBySiteIdAndCode(site.value(), code).map(AppraiserEntity::toAppraiser);
    }

    /** All appraisers with exactly this name; several people may share one. */
    @Transactional(readOnly = true)
    public List<Appraiser> byName(SiteId site, String name) {
        return store.findBySiteIdAndName(site.value(), name).stream()
                .map(AppraiserEntity::toAppraiser)
                .toList();
    }

    /**
     * The appraiser with this number.
     *
     * @throws IllegalArgumentException when there is none
     */
    @Transactional(readOnly = true)
    public Appraiser get(SiteId site, long id) {
        return store.findBySiteIdAndId(site.value(), id)
                .map(AppraiserEntity::toAppraiser)
                .orElseThrow(() -> new IllegalArgumentException("No appraiser has the number " + id));
    }

    /** All appraisers of the site, in the order of their codes. */
    @Transactional(readOnly = true)
    public List<Appraiser> all(SiteId site) {
        return store.findBySiteIdOrderByCode(site.value()).stream()
                .map(AppraiserEntity::toAppraiser)
                .toList();
    }
}
