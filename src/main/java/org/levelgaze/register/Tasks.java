package org.levelgaze.register;

import java.time.Clock;
import java.util.Collection;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.levelgaze.journal.Act;
import org.levelgaze.journal.Actor;
import org.levelgaze.journal.Journal;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** The tasks of a site and their defect kinds. */
@Service
public class Tasks {

    private final TaskRows rows;
    private final Journal journal;
    private final Clock clock;

    Tasks(TaskRows rows, Journal journal, Clock clock) {
        this.rows = rows;
        this.journal = journal;
        this.clock = clock;
    }

    /**
     * Enters a task.
     *
     * @throws Refusal when the code is taken or cannot be used, or two defect kinds share a code
     */
    @Transactional
    public Task create(Actor actor, String code, String name, List<DefectKind> defectKinds) {
        Codes.check("task", code);
        Codes.checkName(name);
        if (byCode(actor.site(), code).isPresent()) {
            throw new Refusal(Refusal.Kind.CONFLICT, "task-exists", code);
        }
        refuseTwice(defectKinds);
        long id = rows.insert(actor.site(), code, name, clock.instant());
        defectKinds.forEach(kind -> rows.addKind(actor.site(), id, kind));
        Task created = new Task(actor.site(), id, code, name, defectKinds);
        journal.record(actor, Act.of("task.created", "task:" + created.id(), created.toString()));
        return created;
    }

    /**
     * Adds defect kinds that a file brought, not rated yet. Codes that the task has already are left as they are.
     *
     * @return the task as it is now
     */
    @Transactional
    public Task addUnrated(Actor actor, Task task, Collection<String> codes) {
        List<DefectKind> added = codes.stream()
                .distinct()
                .filter(code -> task.defectKind(code).isEmpty())
                .map(code -> new DefectKind(code, code, null))
                .toList();
        if (added.isEmpty()) {
            return task;
        }
        added.forEach(kind -> rows.addKind(task.site(), task.id(), kind));
        journal.record(actor, Act.of("task.defect-kinds-added", "task:" + task.id(), added.toString()));
        return get(task.site(), task.id());
    }

    /** The task with this code, if there is one. */
    public Optional<Task> byCode(SiteId site, String code) {
        return rows.byCode(site, code);
    }

    /**
     * The task with this number.
     *
     * @throws IllegalArgumentException when there is none
     */
    public Task get(SiteId site, long id) {
        return rows.byId(site, id).orElseThrow(() -> new IllegalArgumentException("No task has the number " + id));
    }

    /** All tasks of the site, in the order of their codes. */
    public List<Task> all(SiteId site) {
        return rows.all(site);
    }

    private static void refuseTwice(List<DefectKind> kinds) {
        Set<String> known = new HashSet<>();
        for (DefectKind kind : kinds) {
            if (!known.add(kind.code())) {
                throw new Refusal(Refusal.Kind.INVALID, "defect-kind-twice", kind.code());
            }
        }
    }
}
