package org.levelgaze.register;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Timestamp;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.levelgaze.shared.SiteId;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Repository;

/** The SQL of appraisers and camera configurations. */
@Repository
class AppraiserRows {

    private static final String SELECT = """
            select a.site_id, a.appraiser_id, a.code, a.name, a.kind, c.numbers, c.labels, c.changes, c.notes
              from appraiser a
              cross join lateral (
                   select array_agg(configuration_no order by changed_at, configuration_no) as numbers,
                          array_agg(label order by changed_at, configuration_no) as labels,
                          array_agg(changed_at order by changed_at, configuration_no) as changes,
                          array_agg(note order by changed_at, configuration_no) as notes
                     from camera_configuration n
                    where n.site_id = a.site_id and n.appraiser_id = a.appraiser_id) c
             where a.site_id = :site
            """;

    private final JdbcClient jdbc;

    AppraiserRows(JdbcClient jdbc) {
        this.jdbc = jdbc;
    }

    long insert(SiteId site, String code, String name, AppraiserKind kind, Instant at) {
        long id = jdbc.sql("select nextval('appraiser_seq')").query(Long.class).single();
        jdbc.sql("""
                insert into appraiser (site_id, appraiser_id, code, name, kind, created_at)
                values (:site, :id, :code, :name, :kind, :at)""")
                .param("site", site.value())
                .param("id", id)
                .param("code", code)
                .param("name", name)
                .param("kind", kind.word())
                .param("at", Timestamp.from(at))
                .update();
        return id;
    }

    /** Numbers are given in the order of entry. */
    void insertConfiguration(
            SiteId site, long appraiserId, String label, Instant changedAt, String note, Instant recordedAt) {
        jdbc.sql("""
                insert into camera_configuration (site_id, appraiser_id, configuration_no, label, changed_at, note,
                                                  recorded_at)
                select :site, :appraiser, coalesce(max(configuration_no), 0) + 1, :label, :changed, :note, :recorded
                  from camera_configuration where site_id = :site and appraiser_id = :appraiser""")
                .param("site", site.value())
                .param("appraiser", appraiserId)
                .param("label", label)
                .param("changed", Timestamp.from(changedAt))
                .param("note", note)
                .param("recorded", Timestamp.from(recordedAt))
                .update();
    }

    Optional<Appraiser> byCode(SiteId site, String code) {
        return jdbc.sql(SELECT + " and a.code = :code")
                .param("site", site.value())
                .param("code", code)
                .query(AppraiserRows::toAppraiser)
                .optional();
    }

    Optional<Appraiser> byId(SiteId site, long id) {
        return jdbc.sql(SELECT + " and a.appraiser_id = :id")
                .param("site", site.value())
                .param("id", id)
                .query(AppraiserRows::toAppraiser)
                .optional();
    }

    List<Appraiser> byName(SiteId site, String name) {
        return jdbc.sql(SELECT + " and a.name = :name order by a.code")
                .param("site", site.value())
                .param("name", name)
                .query(AppraiserRows::toAppraiser)
                .list();
    }

    List<Appraiser> all(SiteId site) {
        return jdbc.sql(SELECT + " order by a.code")
                .param("site", site.value())
                .query(AppraiserRows::toAppraiser)
                .list();
    }

    private static Appraiser toAppraiser(ResultSet row, int number) throws SQLException {
        List<CameraConfiguration> configurations = new ArrayList<>();
        if (row.getArray("numbers") != null) {
            Integer[] numbers = (Integer[]) row.getArray("numbers").getArray();
            String[] labels = (String[]) row.getArray("labels").getArray();
            Timestamp[] changes = (Timestamp[]) row.getArray("changes").getArray();
            String[] notes = (String[]) row.getArray("notes").getArray();
            for (int i = 0; i < numbers.length; i++) {
                configurations.add(new CameraConfiguration(numbers[i], labels[i], changes[i].toInstant(), notes[i]));
            }
        }
        return new Appraiser(
                new SiteId(row.getInt("site_id")),
                row.getLong("appraiser_id"),
                row.getString("code"),
                row.getString("name"),
                AppraiserKind.ofWord(row.getString("kind")),
                configurations);
    }
}
