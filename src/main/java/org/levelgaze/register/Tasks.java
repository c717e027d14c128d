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

    private final TaskStore store;
    private final Journal journal;
    private final Clock clock;

    Tasks(TaskStore store, Journal journal, Clock clock) {
        this.store = store;
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
        TaskEntity task = new TaskEntity(actor.site(), code, name, clock.instant());
        addAll(task, new HashSet<>(), defectKinds);
        Task created = store.save(task).toTask();
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
        TaskEntity entity = store.findBySiteIdAndId(task.site().value(), task.id())
                .orElseThrow(() -> new IllegalArgumentException("No task has the number " + task.id()));
        Set<String> known = new HashSet<>();
        entity.toTask().defectKinds().forEach(kind -> known.add(kind.code()));
        List<DefectKind> added = codes.stream()
                .distinct()
                .filter(code -> !known.contains(code))
                .map(code -> new DefectKind(code, code, null))
                .toList();
        if (added.isEmpty()) {
            return entity.toTask();
        }
        addAll(entity, known, added);
        store.save(entity);
        journal.record(actor, Act.of("task.defect-kinds-added", "task:" + task.id(), added.toString()));
        return entity.toTask();
    }

    /** The task with this code, if there is one. */
    @Transactional(readOnly = true)
    public Optional<Task> byCode(SiteId site, String code) {
        return store.findBySiteIdAndCode(site.value(), code).map(TaskEntity::toTask);
    }

    /**
     * The task with this number.
     *
     * @throws IllegalArgumentException when there is none
     */
    @Transactional(readOnly = true)
    public Task get(SiteId site, long id) {
        return store.findBySiteIdAndId(site.value(), id)
                .map(TaskEntity::toTask)
                .orElseThrow(() -> new IllegalArgumentException("No task has the number " + id));
    }

    /** All tasks of the site, in the order of their codes. */
    @Transactional(readOnly = true)
    public List<Task> all(SiteId site) {
        return store.findBySiteIdOrderByCode(site.value()).stream()
                .map(TaskEntity::toTask)
                .toList();
    }

    private static void addAll(TaskEntity task, Set<String> known, List<DefectKind> kinds) {
        for (DefectKind kind : kinds) {
            if (!known.add(kind.code())) {
                throw new Refusal(Refusal.Kind.INVALID, "defect-kind-twice", kind.code());
            }
            task.add(kind);
        }
    }
}
