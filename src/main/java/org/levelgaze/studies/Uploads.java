package org.levelgaze.studies;

import java.io.IOException;
import java.io.InputStream;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Timestamp;
import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Repository;
import org.springframework.transaction.annotation.Transactional;
import org.springframework.util.unit.DataSize;

/** Files on their way to a study: kept in the database in parts until it is known what they mean, or for a day. */
@Repository
class Uploads {

    static final Duration KEPT = Duration.ofDays(1);

    private static final int PART = 1 << 20;
    private static final int LONGEST_NAME = 300;
    private static final String SELECT = """
            select site_id, upload_id, owner, file_name, bytes, uploaded_at, state, request, rows_done, bytes_done,
                   study_id, problem
              from upload
             where site_id = :site
            """;

    private final JdbcClient jdbc;
    private final Clock clock;
    private final DataSize largest;

    Uploads(JdbcClient jdbc, Clock clock, @Value("${levelgaze.import.largest-file}") DataSize largest) {
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
        long bytes = keepParts(actor.site(), id, content);
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
            if (bytes > largest.toBytes()) {
                throw tooLarge();
            }
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

    Refusal tooLarge() {
        return new Refusal(Refusal.Kind.TOO_LARGE, "upload-too-large", largest.toMegabytes());
    }

    /** The upload, if this actor brought it. */
    Optional<Upload> find(Actor actor, UUID id) {
        return jdbc.sql(SELECT + " and upload_id = :id and owner = :owner")
                .param("site", actor.site().value())
                .param("id", id)
                .param("owner", actor.who())
                .query(Uploads::toUpload)
                .optional();
    }

    /** What this actor has brought and not taken away, the latest first. */
    List<Upload> open(Actor actor) {
        return jdbc.sql(SELECT + " and owner = :owner and state <> 'done' order by uploaded_at desc limit 20")
                .param("site", actor.site().value())
                .param("owner", actor.who())
                .query(Uploads::toUpload)
                .list();
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

    /** Moves a waiting or refused upload to running; false when somebody else already has. */
    @Transactional
    boolean start(Upload upload, String request) {
        return jdbc.sql("""
                update upload set state = 'running', request = :request, rows_done = 0, bytes_done = 0,
                       cancel_wanted = false, problem = null, changed_at = :now
                 where site_id = :site and upload_id = :id and state in ('waiting', 'refused', 'cancelled', 'broken')""")
                        .param("request", request)
                        .param("now", Timestamp.from(clock.instant()))
                        .param("site", upload.site().value())
                        .param("id", upload.id())
                        .update()
                == 1;
    }

    /** Notes how far the reading is. */
    @Transactional
    void progress(Upload upload, long rows, long bytes) {
        jdbc.sql("""
                update upload set rows_done = :rows, bytes_done = :bytes, changed_at = :now
                 where site_id = :site and upload_id = :id and state = 'running'""")
                .param("rows", rows)
                .param("bytes", bytes)
                .param("now", Timestamp.from(clock.instant()))
                .param("site", upload.site().value())
                .param("id", upload.id())
                .update();
    }

    boolean cancelWanted(Upload upload) {
        return jdbc.sql("select cancel_wanted from upload where site_id = :site and upload_id = :id")
                .param("site", upload.site().value())
                .param("id", upload.id())
                .query(Boolean.class)
                .optional()
                .orElse(true);
    }

    @Transactional
    void wantCancel(Upload upload) {
        jdbc.sql(
                        "update upload set cancel_wanted = true where site_id = :site and upload_id = :id and state = 'running'")
                .param("site", upload.site().value())
                .param("id", upload.id())
                .update();
    }

    /** Ends a run without a study. */
    @Transactional
    void end(Upload upload, Upload.State state, @Nullable String problem) {
        jdbc.sql("""
                update upload set state = :state, problem = :problem, changed_at = :now
                 where site_id = :site and upload_id = :id""")
                .param("state", state.word())
                .param("problem", problem)
                .param("now", Timestamp.from(clock.instant()))
                .param("site", upload.site().value())
                .param("id", upload.id())
                .update();
    }

    /** Ends a run with its study and lets the bytes go; part of the study's own transaction. */
    @Transactional
    void done(Upload upload, long study) {
        jdbc.sql("""
                update upload set state = 'done', study_id = :study, changed_at = :now
                 where site_id = :site and upload_id = :id""")
                .param("study", study)
                .param("now", Timestamp.from(clock.instant()))
                .param("site", upload.site().value())
                .param("id", upload.id())
                .update();
        jdbc.sql("delete from upload_part where site_id = :site and upload_id = :id")
                .param("site", upload.site().value())
                .param("id", upload.id())
                .update();
    }

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

    /** Runs that a stop of the program cut off can be started again. */
    @Transactional
    int breakOffRuns() {
        return jdbc.sql("update upload set state = 'broken' where state = 'running'")
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
                study == 0 ? null : study,
                row.getString("problem"));
    }
}
