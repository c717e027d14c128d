package org.levelgaze.studies.importing;

import java.sql.Timestamp;
import java.time.Clock;
import java.util.Optional;
import org.levelgaze.journal.Act;
import org.levelgaze.journal.Actor;
import org.levelgaze.journal.Journal;
import org.levelgaze.register.Task;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Repository;
import org.springframework.transaction.annotation.Transactional;
import tools.jackson.databind.json.JsonMapper;

/** What a task's files meant the last time, so that the question is asked once. */
@Repository
class Mappings {

    private final JdbcClient jdbc;
    private final JsonMapper json;
    private final Journal journal;
    private final Clock clock;

    Mappings(JdbcClient jdbc, JsonMapper json, Journal journal, Clock clock) {
        this.jdbc = jdbc;
        this.json = json;
        this.journal = journal;
        this.clock = clock;
    }

    /** What is remembered for a task. */
    Optional<Mapping> of(Task task) {
        return jdbc.sql("select mapping from import_mapping where site_id = :site and task_id = :task")
                .param("site", task.site().value())
                .param("task", task.id())
                .query(String.class)
                .optional()
                .map(text -> json.readValue(text, Mapping.class));
    }

    /** Remembers a mapping; one that is remembered already is left as it is. */
    @Transactional
    void remember(Actor actor, Task task, Mapping mapping) {
        if (of(task).filter(mapping::equals).isPresent()) {
            return;
        }
        String text = json.writeValueAsString(mapping);
        jdbc.sql("""
                insert into import_mapping (site_id, task_id, mapping, saved_at) values (:site, :task, :mapping, :now)
                on conflict (site_id, task_id) do update set mapping = excluded.mapping, saved_at = excluded.saved_at""")
                .param("site", task.site().value())
                .param("task", task.id())
                .param("mapping", text)
                .param("now", Timestamp.from(clock.instant()))
                .update();
        journal.record(actor, Act.of("import-mapping.saved", "task:" + task.id(), text));
    }
}
