package org.levelgaze.studies;

import java.sql.Array;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Timestamp;
import java.sql.Types;
import java.time.Instant;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.levelgaze.sets.ReferenceSet;
import org.levelgaze.shared.SiteId;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Repository;

/** The SQL of studies, all but their calls and findings. */
@Repository
class StudyRows {

    private static final String HEAD = """
            select s.site_id, s.study_id, s.task_id, s.set_id, s.edition_no, s.performed_on, s.file_name, s.pieces,
                   s.calls, s.calls_missing, s.recorded_at, c.concluded_at,
                   a.numbers, a.ids, a.configurations, a.trials
              from study s
              left join study_conclusion c using (site_id, study_id)
              cross join lateral (
                   select array_agg(appraiser_no order by appraiser_no) as numbers,
                          array_agg(appraiser_id order by appraiser_no) as ids,
                          array_agg(configuration_no order by appraiser_no) as configurations,
                          array_agg(trials order by appraiser_no) as trials
                     from study_appraiser sa
                    where sa.site_id = s.site_id and sa.study_id = s.study_id) a
             where s.site_id = :site
            """;

    private static final String FILTER = """
               and (cast(:task as bigint) is null or s.task_id = :task)
               and (cast(:set as bigint) is null or s.set_id = :set)
               and (cast(:from as date) is null or s.performed_on >= :from)
               and (cast(:to as date) is null or s.performed_on <= :to)
               and (cast(:appraiser as bigint) is null or exists (
                    select 1 from study_appraiser sa
                     where sa.site_id = s.site_id and sa.study_id = s.study_id and sa.appraiser_id = :appraiser))
            """;

    private static final int BATCH = 10_000;

    private final JdbcClient jdbc;
    private final JdbcTemplate template;

    StudyRows(JdbcClient jdbc, JdbcTemplate template) {
        this.jdbc = jdbc;
        this.template = template;
    }

    long nextId() {
        return jdbc.sql("select nextval('study_seq')").query(Long.class).single();
    }

    /** How often these bytes were taken for this task, set and day. */
    int repeats(StudyHead study, byte[] fileDigest) {
        return jdbc.sql("""
                select count(*) from study
                 where site_id = :site and task_id = :task and set_id = :set and performed_on = :day
                   and file_digest = :digest""")
                .param("site", study.site().value())
                .param("task", study.taskId())
                .param("set", study.setId())
                .param("day", study.performedOn())
                .param("digest", fileDigest)
                .query(Integer.class)
                .single();
    }

    /** The first study that these bytes made for this set and day; null: none. */
    @Nullable
    Long sameBytes(ReferenceSet set, LocalDate performedOn, byte[] fileDigest) {
        return jdbc.sql("""
                select min(study_id) from study
                 where site_id = :site and task_id = :task and set_id = :set and performed_on = :day
                   and file_digest = :digest""")
                .param("site", set.site().value())
                .param("task", set.taskId())
                .param("set", set.id())
                .param("day", performedOn)
                .param("digest", fileDigest)
                .query(Long.class)
                .optional()
                .orElse(null);
    }

    void insert(StudyHead study, byte[] fileDigest, int repeat, String who) {
        jdbc.sql("""
                insert into study (site_id, study_id, task_id, set_id, edition_no, performed_on, file_name, file_digest,
                                   repeat_no, pieces, calls, calls_missing, recorded_at, recorded_by)
                values (:site, :id, :task, :set, :edition, :day, :file, :digest,
                        :repeat, :pieces, :calls, :missing, :at, :who)""")
                .param("site", study.site().value())
                .param("id", study.id())
                .param("task", study.taskId())
                .param("set", study.setId())
                .param("edition", study.edition())
                .param("day", study.performedOn())
                .param("file", study.fileName())
                .param("digest", fileDigest)
                .param("repeat", repeat)
                .param("pieces", study.pieces())
                .param("calls", study.calls())
                .param("missing", study.callsMissing())
                .param("at", Timestamp.from(study.recordedAt()))
                .param("who", who)
                .update();
        insertAppraisers(study);
    }

    private void insertAppraisers(StudyHead study) {
        List<Object[]> values = new ArrayList<>();
        for (StudyHead.Participant one : study.appraisers()) {
            values.add(new Object[] {
                study.site().value(), study.id(), one.number(), one.appraiserId(), one.configuration(), one.trials()
            });
        }
        template.batchUpdate("""
                insert into study_appraiser (site_id, study_id, appraiser_no, appraiser_id, configuration_no, trials)
                values (?, ?, ?, ?, ?, ?)""", values, new int[] {
            Types.INTEGER, Types.BIGINT, Types.SMALLINT, Types.BIGINT, Types.INTEGER, Types.INTEGER
        });
    }

    /** Stores which pieces the study names, in the order of the file. */
    void insertPieces(SiteId site, long study, long[] pieceIds) {
        for (int from = 0; from < pieceIds.length; from += BATCH) {
            template.update(
                    """
                    insert into study_piece (site_id, study_id, piece_no, piece_id)
                    select ?, ?, ? + place - 1, id from unnest(?) with ordinality as taken (id, place)""",
                    site.value(),
                    study,
                    from,
                    Arrays.copyOfRange(pieceIds, from, Math.min(pieceIds.length, from + BATCH)));
        }
    }

    /** Stores the words with which defects were named. */
    void insertSeenKinds(SiteId site, long study, List<String> words) {
        List<Object[]> values = new ArrayList<>();
        for (int i = 0; i < words.size(); i++) {
            values.add(new Object[] {site.value(), study, i, words.get(i)});
        }
        template.batchUpdate(
                "insert into study_seen_kind (site_id, study_id, kind_no, word) values (?, ?, ?, ?)", values);
    }

    void insertConclusion(SiteId site, long study, String who, Instant at) {
        jdbc.sql("""
                insert into study_conclusion (site_id, study_id, concluded_at, concluded_by)
                values (:site, :study, :at, :who)""")
                .param("site", site.value())
                .param("study", study)
                .param("at", Timestamp.from(at))
                .param("who", who)
                .update();
    }

    /** The pieces that a study names, in the order of the file. */
    List<Long> pieceIds(StudyHead study) {
        return jdbc.sql("""
                select piece_id from study_piece where site_id = :site and study_id = :study order by piece_no""")
                .param("site", study.site().value())
                .param("study", study.id())
                .query(Long.class)
                .list();
    }

    Optional<StudyHead> byId(SiteId site, long id) {
        return jdbc.sql(HEAD + " and s.study_id = :id")
                .param("site", site.value())
                .param("id", id)
                .query(StudyRows::toHead)
                .optional();
    }

    /** A page of studies, the latest day first. */
    List<StudyHead> page(SiteId site, StudyFilter filter, int offset, int limit) {
        return filtered(
                        HEAD + FILTER + " order by s.performed_on desc, s.study_id desc limit :limit offset :offset",
                        site,
                        filter)
                .param("limit", limit)
                .param("offset", offset)
                .query(StudyRows::toHead)
                .list();
    }

    /** The studies that stand behind this mark in the list. */
    List<StudyHead> after(SiteId site, StudyFilter filter, StudyCursor cursor, int limit) {
        String below = " and (s.performed_on, s.study_id) < (:day, :id)";
        return filtered(
                        HEAD + FILTER + below + " order by s.performed_on desc, s.study_id desc limit :limit",
                        site,
                        filter)
                .param("day", cursor.day())
                .param("id", cursor.id())
                .param("limit", limit)
                .query(StudyRows::toHead)
                .list();
    }

    int count(SiteId site, StudyFilter filter) {
        return filtered("select count(*) from study s where s.site_id = :site " + FILTER, site, filter)
                .query(Integer.class)
                .single();
    }

    List<Long> idsAfter(SiteId site, long after, int limit) {
        return jdbc.sql("""
                select study_id from study where site_id = :site and study_id > :after order by study_id limit :limit""")
                .param("site", site.value())
                .param("after", after)
                .param("limit", limit)
                .query(Long.class)
                .list();
    }

    private JdbcClient.StatementSpec filtered(String sql, SiteId site, StudyFilter filter) {
        Map<String, Object> values = new HashMap<>();
        values.put("site", site.value());
        values.put("task", filter.taskId());
        values.put("set", filter.setId());
        values.put("appraiser", filter.appraiserId());
        values.put("from", filter.from());
        values.put("to", filter.to());
        return jdbc.sql(sql).params(values);
    }

    private static StudyHead toHead(ResultSet row, int number) throws SQLException {
        Timestamp concluded = row.getTimestamp("concluded_at");
        return new StudyHead(
                new SiteId(row.getInt("site_id")),
                row.getLong("study_id"),
                row.getLong("task_id"),
                row.getLong("set_id"),
                row.getInt("edition_no"),
                row.getDate("performed_on").toLocalDate(),
                row.getString("file_name"),
                row.getInt("pieces"),
                row.getLong("calls"),
                row.getLong("calls_missing"),
                row.getTimestamp("recorded_at").toInstant(),
                concluded == null ? null : concluded.toInstant(),
                participants(row));
    }

    private static List<StudyHead.Participant> participants(ResultSet row) throws SQLException {
        Short[] numbers = array(row.getArray("numbers"), Short[].class);
        Long[] ids = array(row.getArray("ids"), Long[].class);
        Integer[] configurations = array(row.getArray("configurations"), Integer[].class);
        Integer[] trials = array(row.getArray("trials"), Integer[].class);
        List<StudyHead.Participant> result = new ArrayList<>();
        for (int i = 0; i < ids.length; i++) {
            result.add(new StudyHead.Participant(numbers[i], ids[i], configurations[i], trials[i]));
        }
        return result;
    }

    private static <T> T array(Array array, Class<T> type) throws SQLException {
        return type.cast(array.getArray());
    }
}
