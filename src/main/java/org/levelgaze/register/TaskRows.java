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

/** The SQL of tasks and their defect kinds. */
@Repository
class TaskRows {

    private static final String SELECT = """
            select t.site_id, t.task_id, t.code, t.name, k.codes, k.names, k.severities
              from task t
              cross join lateral (
                   select array_agg(code order by position) as codes,
                          array_agg(name order by position) as names,
                          array_agg(coalesce(severity, '') order by position) as severities
                     from defect_kind d
                    where d.site_id = t.site_id and d.task_id = t.task_id) k
             where t.site_id = :site
            """;

    private final JdbcClient jdbc;

    TaskRows(JdbcClient jdbc) {
        this.jdbc = jdbc;
    }

    long insert(SiteId site, String code, String name, Instant at) {
        long id = jdbc.sql("select nextval('task_seq')").query(Long.class).single();
        jdbc.sql("""
                insert into task (site_id, task_id, code, name, created_at) values (:site, :id, :code, :name, :at)""")
                .param("site", site.value())
                .param("id", id)
                .param("code", code)
                .param("name", name)
                .param("at", Timestamp.from(at))
                .update();
        return id;
    }

    /** Adds a defect kind behind those that the task has. */
    void addKind(SiteId site, long taskId, DefectKind kind) {
        Severity severity = kind.severity();
        jdbc.sql("""
                insert into defect_kind (site_id, task_id, position, code, name, severity)
                select :site, :task, coalesce(max(position) + 1, 0), :code, :name, :severity
                  from defect_kind where site_id = :site and task_id = :task""")
                .param("site", site.value())
                .param("task", taskId)
                .param("code", kind.code())
                .param("name", kind.name())
                .param("severity", severity == null ? null : severity.word())
                .update();
    }

    Optional<Task> byCode(SiteId site, String code) {
        return jdbc.sql(SELECT + " and t.code = :code")
                .param("site", site.value())
                .param("code", code)
                .query(TaskRows::toTask)
                .optional();
    }

    Optional<Task> byId(SiteId site, long id) {
        return jdbc.sql(SELECT + " and t.task_id = :id")
                .param("site", site.value())
                .param("id", id)
                .query(TaskRows::toTask)
                .optional();
    }

    List<Task> all(SiteId site) {
        return jdbc.sql(SELECT + " order by t.code")
                .param("site", site.value())
                .query(TaskRows::toTask)
                .list();
    }

    private static Task toTask(ResultSet row, int number) throws SQLException {
        List<DefectKind> kinds = new ArrayList<>();
        if (row.getArray("codes") != null) {
            String[] codes = (String[]) row.getArray("codes").getArray();
            String[] names = (String[]) row.getArray("names").getArray();
            String[] severities = (String[]) row.getArray("severities").getArray();
            for (int i = 0; i < codes.length; i++) {
                Severity severity = severities[i].isEmpty() ? null : Severity.ofWord(severities[i]);
                kinds.add(new DefectKind(codes[i], names[i], severity));
            }
        }
        return new Task(
                new SiteId(row.getInt("site_id")),
                row.getLong("task_id"),
                row.getString("code"),
                row.getString("name"),
                kinds);
    }
}
