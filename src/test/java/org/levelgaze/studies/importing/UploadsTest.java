package org.levelgaze.studies.importing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.time.Duration;
import java.time.LocalDate;
import java.util.List;
import java.util.UUID;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.Tasks;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.levelgaze.studies.Consent;
import org.levelgaze.studies.reading.Layout;
import org.levelgaze.studies.reading.Words;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.jdbc.core.simple.JdbcClient;

/** A run of an upload is stopped, cut off, overtaken or left; nothing is stored twice or in part. */
@SpringBootTest
@WithDatabase
class UploadsTest {

    private static final String FILE = "piece,reference,appraiser,trial,call\nP-1,good,ANA,1,accept\n";

    @Autowired
    Uploads uploads;

    @Autowired
    ImportRun oneRun;

    @Autowired
    ImportPapers papers;

    @Autowired
    Tasks tasks;

    @Autowired
    JdbcClient jdbc;

    private Actor actor = Actor.system(SiteId.MAIN);
    private String code = "";

    @BeforeEach
    void somebodyWithATask() {
        code = UUID.randomUUID().toString();
        actor = new Actor(SiteId.MAIN, "account:" + code);
        tasks.create(actor, code, "Task of its own", List.of());
    }

    @Test
    void storesTheStudyAndEndsTheUploadTogether() throws IOException {
        Upload run = started(kept());

        oneRun.run(actor, run, order(), () -> false);

        Upload done = uploads.get(actor, run.id());
        assertThat(done.state()).isEqualTo(Upload.State.DONE);
        assertThat(done.studyId()).isNotNull();
        assertThat(studies()).isEqualTo(1);
        assertThat(jdbc.sql("select count(*) from upload_part where upload_id = ?")
                        .param(run.id())
                        .query(Integer.class)
                        .single())
                .isZero();
    }

    @Test
    void storesNothingOnceTheUserHasStoppedIt() throws IOException {
        Upload run = started(kept());
        uploads.wantCancel(run);

        oneRun.run(actor, run, order(), () -> false);

        assertThat(uploads.get(actor, run.id()).state()).isEqualTo(Upload.State.CANCELLED);
        assertThat(studies()).isZero();
    }

    @Test
    void canBeStartedAgainAfterTheProgramWentDown() throws IOException {
        Upload run = started(kept());
        oneRun.run(actor, run, order(), () -> true);
        assertThat(uploads.get(actor, run.id()).state()).isEqualTo(Upload.State.BROKEN);

        Upload second = started(uploads.get(actor, run.id()));
        oneRun.run(actor, second, order(), () -> false);

        assertThat(studies()).isEqualTo(1);
    }

    @Test
    void isBrokenOffAfterAMinuteWithoutASignOfLifeAndNoSooner() throws IOException {
        Upload run = started(kept());
        age(run, Uploads.SILENT.minusSeconds(20));
        assertThat(uploads.get(actor, run.id()).state()).isEqualTo(Upload.State.RUNNING);
        assertThat(uploads.start(actor, run, papers.write(order()))).isEmpty();

        age(run, Uploads.SILENT.plusSeconds(1));

        assertThat(uploads.get(actor, run.id()).state()).isEqualTo(Upload.State.BROKEN);
        assertThat(uploads.start(actor, run, papers.write(order()))).isPresent();
    }

    @Test
    void aRunThatWasTakenForDeadStoresNothingWhenItComesBack() throws IOException {
        Upload dead = started(kept());
        age(dead, Uploads.SILENT.plusSeconds(1));
        Upload living = started(uploads.get(actor, dead.id()));

        assertThat(uploads.done(dead, 1)).isFalse();
        assertThat(uploads.progress(dead, 1, 1, null)).isFalse();
        oneRun.run(actor, dead, order(), () -> false);
        oneRun.run(actor, living, order(), () -> false);

        assertThat(studies()).isEqualTo(1);
    }

    @Test
    void isForgottenAfterADayAndNoSooner() throws IOException {
        Upload upload = kept();
        age(upload, Uploads.KEPT.minusMinutes(1));
        uploads.forgetOld();
        assertThat(uploads.get(actor, upload.id()).fileName()).isEqualTo("calls.csv");

        age(upload, Uploads.KEPT.plusMinutes(1));
        uploads.forgetOld();

        assertThatThrownBy(() -> uploads.get(actor, upload.id()))
                .isInstanceOfSatisfying(
                        Refusal.class, refusal -> assertThat(refusal.type()).isEqualTo("unknown-upload"));
    }

    @Test
    void readsBackAFileOfSeveralPartsAsItCame() throws IOException {
        byte[] large = "x".repeat(2_500_000).getBytes(StandardCharsets.UTF_8);

        UUID id = uploads.keep(actor, "large.csv", new ByteArrayInputStream(large));

        Upload kept = uploads.get(actor, id);
        assertThat(kept.bytes()).isEqualTo(large.length);
        assertThat(uploads.content(kept).readAllBytes()).isEqualTo(large);
    }

    private Upload kept() throws IOException {
        byte[] bytes = FILE.getBytes(StandardCharsets.UTF_8);
        return uploads.get(actor, uploads.keep(actor, "calls.csv", new ByteArrayInputStream(bytes)));
    }

    private Upload started(Upload upload) {
        return uploads.start(actor, upload, papers.write(order())).orElseThrow();
    }

    private ImportOrder order() {
        ImportForm form = new ImportForm(null, null, null, null, null, null, null, null, null, null, null);
        Mapping mapping = new Mapping(Layout.standard(), Words.standard());
        return new ImportOrder(
                form, code, null, "S-" + code, LocalDate.of(2026, 3, 2), null, mapping, Consent.EVERYTHING_NEW);
    }

    private void age(Upload upload, Duration age) {
        jdbc.sql("update upload set changed_at = now() - make_interval(secs => ?) where upload_id = ?")
                .params(age.toSeconds(), upload.id())
                .update();
    }

    private int studies() {
        return jdbc.sql("select count(*) from study where recorded_by = ?")
                .param(actor.who())
                .query(Integer.class)
                .single();
    }
}
