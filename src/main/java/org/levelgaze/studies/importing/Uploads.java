package org.levelgaze.studies.importing;

import java.io.IOException;
import java.io.InputStream;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Timestamp;
import java.sql.Types;
import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.levelgaze.studies.LargestFile;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Repository;
import org.springframework.transaction.annotation.Propagation;
import org.springframework.transaction.annotation.Transactional;

/** Files on their way to a study: kept in the database in parts until it is known what they mean, or for a day. */
@Repository
class Uploads {

    static final Duration KEPT = Duration.ofDays(1);

    /** A run that gives no sign of life for so long was cut off, by a stop of the program or of its machine. */
    static final Duration SILENT = Duration.ofMinutes(1);

    private static final int PART = 1 << 20;
    private static final int LONGEST_NAME = 300;
    private static final String SELECT = """
            select site_id, upload_id, owner, file_name, bytes, uploaded_at, request, rows_done, bytes_done,
                   calls_in_all, run_no, study_id, problem,
                   case when state = 'running' and changed_at < :silentSince then 'broken' else state end as state
              from upload
             where site_id = :site and owner = :owner
            """;

    private static final String OF_RUN =
            " where site_id = :site and upload_id = :id and state = 'running' and run_no = :run";

    private final JdbcClient jdbc;
    private final Clock clock;
    private final LargestFile largest;

    Uploads(JdbcClient jdbc, Clock clock, LargestFile largest) {
        this.jdbc = jdbc;
        this.clock = clock;
        this.largest = largest;
    }

    /**
     * Keeps a file.
     *
     * @throws Refusal when it is larger than what is taken; nothing is kept then
     */
    @Transactional
    UUID keep(Actor actor, String fileName, InputStream content) throws IOException {
        UUID id = UUID.randomUUID();
        Timestamp now = Timestamp.from(clock.instant());
        jdbc.sql("""
                insert into upload (site_id, upload_id, owner, file_name, uploaded_at, state, changed_at)
                values (:site, :id, :owner, :file, :now, 'waiting', :now)""")
                .param("site", actor.site().value())
                .param("id", id)
                .param("owner", actor.who())
                .param("file", shortened(fileName))
                .param("now", now)
                .update();
        long bytes = keepParts(actor.site(), id, largest.within(content, -1));
        jdbc.sql("update upload set bytes = :bytes where site_id = :site and upload_id = :id")
                .param("bytes", bytes)
                .param("site", actor.site().value())
                .param("id", id)
                .update();
        return id;
    }

    private long keepParts(SiteId site, UUID id, InputStream content) throws IOException {
        long bytes = 0;
        int number = 0;
        byte[] part = content.readNBytes(PART);
        while (part.length > 0) {
            bytes += part.length;
            jdbc.sql("insert into upload_part (site_id, upload_id, part_no, content) values (:site, :id, :no, :part)")
                    .param("site", site.value())
                    .param("id", id)
                    .param("no", number++)
                    .param("part", part)
                    .update();
            part = content.readNBytes(PART);
        }
        return bytes;
    }

    /** The most bytes that a file may have. */
    long largest() {
        return largest.bytes();
    }

    /**
     * The upload, if this actor brought it.
     *
     * @throws Refusal when there is none, or somebody else brought it
     */
    Upload get(Actor actor, UUID id) {
        return jdbc.sql(SELECT + " and upload_id = :id")
                .param("site", actor.site().value())
                .param("owner", actor.who())
                .param("silentSince", silentSince())
                .param("id", id)
                .query(Uploads::toUpload)
                .optional()
                .orElseThrow(() -> new Refusal(Refusal.Kind.NOT_FOUND, "unknown-upload"));
    }

    /** What this actor has brought and not taken away, the latest first. */
    List<Upload> open(Actor actor) {
        return jdbc.sql(SELECT + " and state <> 'done' order by uploaded_at desc limit 20")
                .param("site", actor.site().value())
                .param("owner", actor.who())
                .param("silentSince", silentSince())
                .query(Uploads::toUpload)
                .list();
    }

    private Timestamp silentSince() {
        return Timestamp.from(clock.instant().minus(SILENT));
    }

    /** Reads the file's bytes, part by part. */
    InputStream content(Upload upload) {
        return new PartStream(number -> part(upload.site(), upload.id(), number));
    }

    private byte @Nullable [] part(SiteId site, UUID id, int number) {
        return jdbc.sql("select content from upload_part where site_id = :site and upload_id = :id and part_no = :no")
                .param("site", site.value())
                .param("id", id)
                .param("no", number)
                .query((row, n) -> row.getBytes(1))
                .optional()
                .orElse(null);
    }

    /**
     * Starts a run of an upload that has none; of two clicks at once only one comes through.
     *
     * @param request what the user said the file means, as JSON
     * @return the upload with its run; none when somebody else was first
     */
    @Transactional
    Optional<Upload> start(Actor actor, Upload upload, String request) {
        int started = jdbc.sql("""
                update upload set state = 'running', request = :request, rows_done = 0, bytes_done = 0,
                       calls_in_all = null, run_no = run_no + 1, cancel_wanted = false, problem = null, changed_at = :now
                 where site_id = :site and upload_id = :id
                   and (state in ('waiting', 'refused', 'cancelled', 'broken')
                        or state = 'running' and changed_at < :silentSince)""")
                .param("request", request)
                .param("now", Timestamp.from(clock.instant()))
                .param("site", upload.site().value())
                .param("id", upload.id())
                .param("silentSince", silentSince())
                .update();
        return started == 1 ? Optional.of(get(actor, upload.id())) : Optional.empty();
    }

    /**
     * Notes how far a run is, at once and whatever becomes of the transaction around it.
     *
     * @param rows rows read, or calls stored once {@code callsInAll} is known
     * @param bytes bytes read
     * @param callsInAll calls to store; null while the file is being read
     * @return whether to go on: nobody wants it stopped, and no later run has taken over
     */
    @Transactional(propagation = Propagation.REQUIRES_NEW)
    boolean progress(Upload run, long rows, long bytes, @Nullable Long callsInAll) {
        return jdbc.sql("""
                update upload set rows_done = :rows, bytes_done = :bytes, calls_in_all = :calls, changed_at = :now
                """ + OF_RUN + " returning not cancel_wanted")
                .param("rows", rows)
                .param("bytes", bytes)
                .param("calls", callsInAll, Types.BIGINT)
                .param("now", Timestamp.from(clock.instant()))
                .params(ofRun(run))
                .query(Boolean.class)
                .optional()
                .orElse(false);
    }

    /** A sign of life of a run that waits for its turn or is busy with one long step. */
    @Transactional
    void touch(Upload run) {
        jdbc.sql("update upload set changed_at = :now" + OF_RUN)
                .param("now", Timestamp.from(clock.instant()))
                .params(ofRun(run))
                .update();
    }

    @Transactional
    void wantCancel(Upload upload) {
        jdbc.sql("""
                update upload set cancel_wanted = true
                 where site_id = :site and upload_id = :id and state = 'running'""")
                .param("site", upload.site().value())
                .param("id", upload.id())
                .update();
    }

    /** Ends a run without a study; does nothing when a later run has taken over. */
    @Transactional
    void end(Upload run, Upload.State state, @Nullable String problem) {
        jdbc.sql("update upload set state = :state, problem = :problem, changed_at = :now" + OF_RUN)
                .param("state", state.word())
                .param("problem", problem)
                .param("now", Timestamp.from(clock.instant()))
                .params(ofRun(run))
                .update();
    }

    /**
     * Ends a run with its study and lets the bytes go; part of the study's own transaction.
     *
     * @return false when a later run has taken over: the study must not be stored
     */
    @Transactional
    boolean done(Upload run, long study) {
        int ended = jdbc.sql("update upload set state = 'done', study_id = :study, changed_at = :now" + OF_RUN)
                .param("study", study)
                .param("now", Timestamp.from(clock.instant()))
                .params(ofRun(run))
                .update();
        if (ended == 0) {
            return false;
        }
        jdbc.sql("delete from upload_part where site_id = :site and upload_id = :id")
                .param("site", run.site().value())
                .param("id", run.id())
                .update();
        return true;
    }

    private static Map<String, Object> ofRun(Upload run) {
        return Map.of("site", run.site().value(), "id", run.id(), "run", run.run());
    }

    /** Lets a file take the place of another, with what was said about it. */
    @Transactional
    void replace(Actor actor, UUID former, UUID latter) {
        Upload old = get(actor, former);
        jdbc.sql("update upload set request = :request where site_id = :site and upload_id = :id")
                .param("request", old.request())
                .param("site", actor.site().value())
                .param("id", latter)
                .update();
        forget(old);
    }

    /** Takes a file away that nothing is being done with. */
    @Transactional
    void forget(Upload upload) {
        jdbc.sql("delete from upload where site_id = :site and upload_id = :id and state <> 'running'")
                .param("site", upload.site().value())
                .param("id", upload.id())
                .update();
    }

    /** Lets go what nobody came back for. */
    @Transactional
    int forgetOld() {
        Instant before = clock.instant().minus(KEPT);
        return jdbc.sql("delete from upload where changed_at < :before")
                .param("before", Timestamp.from(before))
                .update();
    }

    private static String shortened(String name) {
        String printable = name.replaceAll("\\p{Cntrl}", " ");
        return printable.length() <= LONGEST_NAME ? printable : printable.substring(printable.length() - LONGEST_NAME);
    }

    private static Upload toUpload(ResultSet row, int number) throws SQLException {
        long study = row.getLong("study_id");
        return new Upload(
                new SiteId(row.getInt("site_id")),
                row.getObject("upload_id", UUID.class),
                row.getString("file_name"),
                row.getLong("bytes"),
                row.getTimestamp("uploaded_at").toInstant(),
                Upload.State.ofWord(row.getString("state")),
                row.getString("request"),
                row.getLong("rows_done"),
                row.getLong("bytes_done"),
                row.getObject("calls_in_all", Long.class),
                row.getInt("run_no"),
                study == 0 ? null : study,
                row.getString("problem"));
    }
}
