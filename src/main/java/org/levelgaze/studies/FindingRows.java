package org.levelgaze.studies;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Timestamp;
import java.sql.Types;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.AppraiserFindings;
import org.levelgaze.agreement.Findings;
import org.levelgaze.agreement.Interval;
import org.levelgaze.agreement.Share;
import org.levelgaze.shared.SiteId;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Repository;

/** The SQL of findings, and of the few figures per appraiser that lists and trends read. */
@Repository
class FindingRows {

    private static final int[] FIGURE_TYPES = {
        Types.INTEGER, Types.BIGINT, Types.INTEGER, Types.VARCHAR, Types.BIGINT, Types.BIGINT, Types.BIGINT,
        Types.BIGINT, Types.BIGINT, Types.BIGINT, Types.BIGINT, Types.DOUBLE, Types.VARCHAR, Types.DOUBLE,
        Types.DOUBLE, Types.DOUBLE
    };

    private final JdbcClient jdbc;
    private final JdbcTemplate template;

    FindingRows(JdbcClient jdbc, JdbcTemplate template) {
        this.jdbc = jdbc;
        this.template = template;
    }

    void insert(StudyHead study, String engine, Findings findings, String json, Instant at) {
        jdbc.sql("""
                insert into finding (site_id, study_id, edition_no, engine_version, confidence, findings, computed_at)
                values (:site, :study, :edition, :engine, :confidence, :findings, :at)""")
                .param("site", study.site().value())
                .param("study", study.id())
                .param("edition", study.edition())
                .param("engine", engine)
                .param("confidence", findings.confidence())
                .param("findings", json)
                .param("at", Timestamp.from(at))
                .update();
        insertFigures(study, engine, findings);
    }

    private void insertFigures(StudyHead study, String engine, Findings findings) {
        List<Object[]> values = new ArrayList<>();
        for (StudyHead.Participant one : study.appraisers()) {
            values.add(figure(study, engine, one, findings.appraisers().get(one.number())));
        }
        template.batchUpdate("""
                insert into appraiser_figure (site_id, study_id, edition_no, engine_version, appraiser_id,
                        right_pieces, complete_pieces, false_accepts, calls_on_defective, false_rejects, calls_on_good,
                        bias_ratio, bias_status, criterion_c, criterion_c_low, criterion_c_high)
                values (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)""", values, FIGURE_TYPES);
    }

    private static @Nullable Object[] figure(
            StudyHead study, String engine, StudyHead.Participant one, AppraiserFindings found) {
        Share right = found.effectiveness().byPiece();
        Interval c = found.signalDetection().criterionCInterval();
        return new @Nullable Object[] {
            study.site().value(),
            study.id(),
            study.edition(),
            engine,
            one.appraiserId(),
            right.k(),
            right.n(),
            found.falseAccept().k(),
            found.falseAccept().n(),
            found.falseReject().k(),
            found.falseReject().n(),
            found.biasRatio().ofRates(),
            found.biasRatio().status().text(),
            found.signalDetection().criterionC(),
            c == null ? null : c.lower(),
            c == null ? null : c.upper()
        };
    }

    /** The findings of a study by the newest engine that computed them, as JSON. */
    Optional<StoredFinding> newest(SiteId site, long study) {
        return jdbc.sql("""
                select edition_no, engine_version, confidence, findings, computed_at from finding
                 where site_id = :site and study_id = :study
                 order by edition_no desc, computed_at desc limit 1""")
                .param("site", site.value())
                .param("study", study)
                .query((row, number) -> new StoredFinding(
                        row.getInt("edition_no"),
                        row.getString("engine_version"),
                        row.getDouble("confidence"),
                        row.getString("findings"),
                        row.getTimestamp("computed_at").toInstant()))
                .optional();
    }

    /** Whether the figures beside stored findings are the ones that follow from them. */
    boolean figuresAgree(StudyHead study, StoredFinding stored, Findings findings) {
        List<String> expected = study.appraisers().stream()
                .map(one -> Arrays.toString(figure(
                        study, stored.engine(), one, findings.appraisers().get(one.number()))))
                .sorted()
                .toList();
        List<String> present = jdbc.sql("""
                select site_id, study_id, edition_no, engine_version, appraiser_id,
                       right_pieces::bigint, complete_pieces::bigint, false_accepts::bigint, calls_on_defective::bigint,
                       false_rejects::bigint, calls_on_good::bigint,
                       bias_ratio, bias_status, criterion_c, criterion_c_low, criterion_c_high
                  from appraiser_figure
                 where site_id = :site and study_id = :study and edition_no = :edition and engine_version = :engine""")
                .param("site", study.site().value())
                .param("study", study.id())
                .param("edition", stored.edition())
                .param("engine", stored.engine())
                .query((row, number) -> asText(row))
                .list();
        return present.stream().sorted().toList().equals(expected);
    }

    private static String asText(ResultSet row) throws SQLException {
        Object[] values = new Object[FIGURE_TYPES.length];
        for (int i = 0; i < values.length; i++) {
            values[i] = row.getObject(i + 1);
        }
        return Arrays.toString(values);
    }

    /** The figures of one appraiser, the earliest day first. */
    List<Figure> figures(SiteId site, long appraiserId, @Nullable Long taskId) {
        return jdbc.sql("""
                select distinct on (s.performed_on, f.study_id)
                       s.performed_on, s.task_id, s.set_id, f.*
                  from appraiser_figure f
                  join study s using (site_id, study_id)
                 where f.site_id = :site and f.appraiser_id = :appraiser
                   and (cast(:task as bigint) is null or s.task_id = :task)
                 order by s.performed_on, f.study_id, f.edition_no desc, f.engine_version desc""")
                .param("site", site.value())
                .param("appraiser", appraiserId)
                .param("task", taskId)
                .query(FindingRows::toFigure)
                .list();
    }

    /** The figures of some studies, whoever took part. */
    List<AppraiserFigure> figuresOf(SiteId site, List<Long> studies) {
        if (studies.isEmpty()) {
            return List.of();
        }
        return jdbc.sql("""
                select distinct on (f.study_id, f.appraiser_id)
                       s.performed_on, s.task_id, s.set_id, f.*
                  from appraiser_figure f
                  join study s using (site_id, study_id)
                 where f.site_id = :site and f.study_id in (:studies)
                 order by f.study_id, f.appraiser_id, f.edition_no desc, f.engine_version desc""")
                .param("site", site.value())
                .param("studies", studies)
                .query((row, number) -> new AppraiserFigure(row.getLong("appraiser_id"), toFigure(row, number)))
                .list();
    }

    /** The newest study's figure of each appraiser who has one. */
    List<AppraiserFigure> newestFigures(SiteId site) {
        return jdbc.sql("""
                select distinct on (f.appraiser_id)
                       s.performed_on, s.task_id, s.set_id, f.*
                  from appraiser_figure f
                  join study s using (site_id, study_id)
                 where f.site_id = :site
                 order by f.appraiser_id, s.performed_on desc, f.study_id desc, f.edition_no desc, f.engine_version desc""")
                .param("site", site.value())
                .query((row, number) -> new AppraiserFigure(row.getLong("appraiser_id"), toFigure(row, number)))
                .list();
    }

    private static Figure toFigure(ResultSet row, int number) throws SQLException {
        return new Figure(
                row.getLong("study_id"),
                row.getDate("performed_on").toLocalDate(),
                row.getLong("task_id"),
                row.getLong("set_id"),
                new Figure.Count(row.getInt("right_pieces"), row.getInt("complete_pieces")),
                new Figure.Count(row.getInt("false_accepts"), row.getInt("calls_on_defective")),
                new Figure.Count(row.getInt("false_rejects"), row.getInt("calls_on_good")),
                row.getObject("bias_ratio", Double.class),
                row.getString("bias_status"),
                row.getObject("criterion_c", Double.class),
                row.getObject("criterion_c_low", Double.class),
                row.getObject("criterion_c_high", Double.class));
    }

    /** Findings as they are stored. */
    record StoredFinding(int edition, String engine, double confidence, String json, Instant computedAt) {}
}
