package org.levelgaze.sets;

import java.sql.Date;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Timestamp;
import java.time.Instant;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import org.jspecify.annotations.Nullable;
import org.levelgaze.shared.SiteId;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Repository;

/** The SQL of sets, editions and pieces. */
@Repository
class SetRows {

    private static final String SET = "select site_id, set_id, code, task_id from reference_set where site_id = :site ";
    private static final int BATCH = 10_000;

    private final JdbcClient jdbc;
    private final JdbcTemplate template;

    SetRows(JdbcClient jdbc, JdbcTemplate template) {
        this.jdbc = jdbc;
        this.template = template;
    }

    ReferenceSet insertSet(SiteId site, long taskId, String code, Basis basis, Instant at) {
        long id = jdbc.sql("select nextval('reference_set_seq')")
                .query(Long.class)
                .single();
        jdbc.sql("""
                insert into reference_set (site_id, set_id, task_id, code, origin, created_at)
                values (:site, :id, :task, :code, :origin, :at)""")
                .param("site", site.value())
                .param("id", id)
                .param("task", taskId)
                .param("code", code)
                .param("origin", basis == Basis.IMPORT ? "import" : "registered")
                .param("at", Timestamp.from(at))
                .update();
        return new ReferenceSet(site, id, code, taskId);
    }

    void insertFirstEdition(ReferenceSet set, NewSet content, String who, Instant at) {
        jdbc.sql("""
                insert into edition (site_id, set_id, edition_no, decided_on, decided_by, valid_until, basis,
                                     recorded_at, recorded_by)
                values (:site, :set, 1, :decidedOn, :decidedBy, :validUntil, :basis, :at, :who)""")
                .param("site", set.site().value())
                .param("set", set.id())
                .param("decidedOn", content.decidedOn())
                .param("decidedBy", content.decidedBy())
                .param("validUntil", content.lastDay())
                .param("basis", content.basis().word())
                .param("at", Timestamp.from(at))
                .param("who", who)
                .update();
        for (int from = 0; from < content.pieces().size(); from += BATCH) {
            int to = Math.min(content.pieces().size(), from + BATCH);
            insertPieces(set, from, content.pieces().subList(from, to));
        }
    }

    /** Some thousands of pieces in one statement each, since a camera may be tried on a great many. */
    private void insertPieces(ReferenceSet set, int position, List<NewPiece> pieces) {
        long[] ids = jdbc
                .sql("select nextval('piece_seq') from generate_series(1, :n)")
                .param("n", pieces.size())
                .query(Long.class)
                .stream()
                .mapToLong(Long::longValue)
                .toArray();
        template.update("""
                insert into piece (site_id, set_id, piece_id, label)
                select ?, ?, id, label from unnest(?, ?) as brought (id, label)""", set.site().value(), set.id(), ids, texts(pieces, NewPiece::label));
        template.update(
                """
                insert into edition_piece (site_id, set_id, edition_no, position, piece_id, task_id, true_state,
                                           defect_kind, zone)
                select ?, ?, 1, ? + place - 1, id, ?, true_state, defect_kind, zone
                  from unnest(?, ?, ?, ?) with ordinality as brought (id, true_state, defect_kind, zone, place)""",
                set.site().value(),
                set.id(),
                position,
                set.taskId(),
                ids,
                texts(pieces, piece -> piece.trueState().word()),
                texts(pieces, NewPiece::defectKind),
                texts(pieces, SetRows::zone));
    }

    private static @Nullable String zone(NewPiece piece) {
        Zone zone = piece.zone();
        return zone == null ? null : zone.words();
    }

    private static @Nullable String[] texts(List<NewPiece> pieces, Function<NewPiece, @Nullable String> text) {
        return pieces.stream().map(text).toArray(String[]::new);
    }

    Optional<ReferenceSet> setByCode(SiteId site, String code) {
        return jdbc.sql(SET + "and code = :code")
                .param("site", site.value())
                .param("code", code)
                .query(SetRows::toSet)
                .optional();
    }

    Optional<ReferenceSet> setById(SiteId site, long id) {
        return jdbc.sql(SET + "and set_id = :id")
                .param("site", site.value())
                .param("id", id)
                .query(SetRows::toSet)
                .optional();
    }

    List<ReferenceSet> sets(SiteId site) {
        return jdbc.sql(SET + "order by code")
                .param("site", site.value())
                .query(SetRows::toSet)
                .list();
    }

    List<Edition> editions(ReferenceSet set) {
        return jdbc.sql("""
                select e.set_id, e.edition_no, e.decided_on, e.decided_by, e.valid_until, e.basis,
                       count(*) as pieces,
                       count(*) filter (where p.true_state = 'defective') as defective,
                       count(*) filter (where p.true_state = 'grey') as grey
                  from edition e
                  join edition_piece p using (site_id, set_id, edition_no)
                 where e.site_id = :site and e.set_id = :set
                 group by e.site_id, e.set_id, e.edition_no
                 order by e.edition_no desc""")
                .param("site", set.site().value())
                .param("set", set.id())
                .query(SetRows::toEdition)
                .list();
    }

    List<EditionPiece> pieces(ReferenceSet set, int edition) {
        return jdbc.sql("""
                select p.piece_id, p.label, e.true_state, e.defect_kind, e.zone
                  from edition_piece e
                  join piece p using (site_id, piece_id)
                 where e.site_id = :site and e.set_id = :set and e.edition_no = :edition
                 order by e.position""")
                .param("site", set.site().value())
                .param("set", set.id())
                .param("edition", edition)
                .query(SetRows::toPiece)
                .list();
    }

    /** Returns whether this was the first time. */
    boolean recordKeyReading(ReferenceSet set, int edition, String who, String page, Instant at) {
        return jdbc.sql("""
                insert into answer_key_reading (site_id, set_id, edition_no, who, first_read_at, on_page)
                values (:site, :set, :edition, :who, :at, :page)
                on conflict do nothing""")
                        .param("site", set.site().value())
                        .param("set", set.id())
                        .param("edition", edition)
                        .param("who", who)
                        .param("at", Timestamp.from(at))
                        .param("page", page)
                        .update()
                == 1;
    }

    List<KeyReading> keyReadings(ReferenceSet set, int edition) {
        return jdbc.sql("""
                select who, first_read_at, on_page from answer_key_reading
                 where site_id = :site and set_id = :set and edition_no = :edition
                 order by first_read_at, who""")
                .param("site", set.site().value())
                .param("set", set.id())
                .param("edition", edition)
                .query((row, number) -> new KeyReading(
                        row.getString("who"), row.getTimestamp("first_read_at").toInstant(), row.getString("on_page")))
                .list();
    }

    private static ReferenceSet toSet(ResultSet row, int number) throws SQLException {
        return new ReferenceSet(
                new SiteId(row.getInt("site_id")),
                row.getLong("set_id"),
                row.getString("code"),
                row.getLong("task_id"));
    }

    private static Edition toEdition(ResultSet row, int number) throws SQLException {
        return new Edition(
                row.getLong("set_id"),
                row.getInt("edition_no"),
                day(row, "decided_on"),
                row.getString("decided_by"),
                day(row, "valid_until"),
                Basis.ofWord(row.getString("basis")),
                row.getInt("pieces"),
                row.getInt("defective"),
                row.getInt("grey"));
    }

    private static EditionPiece toPiece(ResultSet row, int number) throws SQLException {
        String zone = row.getString("zone");
        return new EditionPiece(
                row.getLong("piece_id"),
                row.getString("label"),
                TrueState.ofWord(row.getString("true_state")),
                row.getString("defect_kind"),
                zone == null ? null : Zone.ofWords(zone));
    }

    private static LocalDate day(ResultSet row, String column) throws SQLException {
        Date date = row.getDate(column);
        return date.toLocalDate();
    }
}
