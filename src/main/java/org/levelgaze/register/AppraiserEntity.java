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
import jakarta.persistence.SequenceGenerator;
import jakarta.persistence.Table;
import java.time.Instant;
import java.util.Comparator;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.levelgaze.shared.SiteId;

/** An appraiser as it is stored. */
@Entity
@Table(name = "appraiser")
class AppraiserEntity {

    @Id
    @GeneratedValue(strategy = GenerationType.SEQUENCE, generator = "appraiser_seq")
    @SequenceGenerator(name = "appraiser_seq", sequenceName = "appraiser_seq", allocationSize = 1)
    @Column(name = "appraiser_id")
    private @Nullable Long id;

    @Column(name = "site_id", updatable = false)
    private int siteId;

    private String code = "";

    private String name = "";

    @Column(updatable = false)
    private String kind = "";

    @Column(name = "created_at", updatable = false)
    private Instant createdAt = Instant.EPOCH;

    /** A set, so that adding one is one insert: rows of a list would be written anew. */
    @ElementCollection(fetch = FetchType.EAGER)
    @CollectionTable(name = "camera_configuration", joinColumns = @JoinColumn(name = "appraiser_id"))
    private Set<Configuration> configurations = new HashSet<>();

    /** A configuration as it is stored; the site stands in every row. */
    @Embeddable
    record Configuration(
            @Column(name = "site_id") int siteId,
            @Column(name = "configuration_no") int number,
            String label,
            @Column(name = "changed_at") Instant changedAt,
            String note,
            @Column(name = "recorded_at") Instant recordedAt) {}

    /** For JPA. */
    protected AppraiserEntity() {}

    AppraiserEntity(SiteId site, String code, String name, AppraiserKind kind, Instant createdAt) {
        this.siteId = site.value();
        this.code = code;
        this.name = name;
        this.kind = kind.word();
        this.createdAt = createdAt;
    }

    void addConfiguration(String label, Instant changedAt, String note, Instant recordedAt) {
        configurations.add(new Configuration(siteId, configurations.size() + 1, label, changedAt, note, recordedAt));
    }

    Appraiser toAppraiser() {
        if (id == null) {
            throw new IllegalStateException("Appraiser " + code + " has not been stored");
        }
        List<CameraConfiguration> inOrder = configurations.stream()
                .map(c -> new CameraConfiguration(c.number(), c.label(), c.changedAt(), c.note()))
                .sorted(Comparator.comparing(CameraConfiguration::changedAt).thenComparing(CameraConfiguration::number))
                .toList();
        return new Appraiser(new SiteId(siteId), id, code, name, AppraiserKind.ofWord(kind), inOrder);
    }
}
