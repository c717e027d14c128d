package org.levelgaze.register;

import jakarta.persistence.CollectionTable;
import jakarta.persistence.Column;
import jakarta.persistence.ElementCollection;
import jakarta.persistence.Embeddable;
import jakarta.persistence.Entity;
import jakarta.persistence.FetchType;
import jakarta.persistence.GeneratedValue;
import jakarta.persistence.GenerationType;
import jakarta.persistence.Id;
import jakarta.persistence.JoinColumn;
import jakarta.persistence.OrderColumn;
import jakarta.persistence.SequenceGenerator;
import jakarta.persistence.Table;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.levelgaze.shared.SiteId;

/** A task as it is stored. */
@Entity
@Table(name = "task")
class TaskEntity {

    @Id
    @GeneratedValue(strategy = GenerationType.SEQUENCE, generator = "task_seq")
    @SequenceGenerator(name = "task_seq", sequenceName = "task_seq", allocationSize = 1)
    @Column(name = "task_id")
    private @Nullable Long id;

    @Column(name = "site_id", updatable = false)
    private int siteId;

    private String code = "";

    private String name = "";

    @Column(name = "created_at", updatable = false)
    private Instant createdAt = Instant.EPOCH;

    @ElementCollection(fetch = FetchType.EAGER)
    @CollectionTable(name = "defect_kind", joinColumns = @JoinColumn(name = "task_id"))
    @OrderColumn(name = "position")
    private List<Kind> kinds = new ArrayList<>();

    /** A defect kind as it is stored; the site stands in every row. */
    @Embeddable
    record Kind(
            @Column(name = "site_id") int siteId,
            String code,
            String name,
            @Nullable String severity) {}

    /** For JPA. */
    protected TaskEntity() {}

    TaskEntity(SiteId site, String code, String name, Instant createdAt) {
        this.siteId = site.value();
        this.code = code;
        this.name = name;
        this.createdAt = createdAt;
    }

    void add(DefectKind kind) {
        Severity severity = kind.severity();
        kinds.add(new Kind(siteId, kind.code(), kind.name(), severity == null ? null : severity.word()));
    }

    Task toTask() {
        if (id == null) {
            throw new IllegalStateException("Task " + code + " has not been stored");
        }
        List<DefectKind> defectKinds = kinds.stream().map(TaskEntity::toKind).toList();
        return new Task(new SiteId(siteId), id, code, name, defectKinds);
    }

    private static DefectKind toKind(Kind kind) {
        return new DefectKind(
                kind.code(), kind.name(), kind.severity() == null ? null : Severity.ofWord(kind.severity()));
    }
}
