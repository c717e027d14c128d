package org.levelgaze.studies;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.time.LocalDate;
import java.util.List;
import java.util.UUID;
import org.junit.jupiter.api.Test;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.Tasks;
import org.levelgaze.shared.SiteId;
import org.levelgaze.shared.TodayLine;
import org.levelgaze.shared.TodaySource;
import org.levelgaze.studies.reading.CallReader;
import org.levelgaze.studies.reading.Reading;
import org.levelgaze.studies.reading.Watcher;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.jdbc.core.simple.JdbcClient;

@SpringBootTest
@WithDatabase
class StudiesTodayTest {

    private static final Actor ENGINEER = new Actor(SiteId.MAIN, "account:77");

    @Autowired
    List<TodaySource> sources;

    @Autowired
    StudyImport imports;

    @Autowired
    Studies studies;

    @Autowired
    Tasks tasks;

    @Autowired
    JdbcClient jdbc;

    @Test
    void aStudyWithoutConclusionNeedsAHandUntilItIsConcluded() throws IOException {
        tasks.create(ENGINEER, "T-today", "Today", List.of());
        StudyRequest request = new StudyRequest(
                "T-today", "S-today", LocalDate.of(2026, 3, 2), null, false, "rim.csv", Consent.EVERYTHING_NEW);
        byte[] file =
                "piece,reference,appraiser,trial,call\n1,good,ANA-today,1,accept\n2,defective,ANA-today,1,reject\n"
                        .getBytes(StandardCharsets.UTF_8);
        Reading.Read read = (Reading.Read) CallReader.standard().read(new ByteArrayInputStream(file));
        StudyHead study = ((ImportOutcome.Stored) imports.take(ENGINEER, request, read.calls(), Watcher.NONE)).study();
        TodayLine line = new TodayLine(
                "studies.today.open",
                List.of(Long.toString(study.id()), "rim.csv"),
                "studies.today.open.button",
                "/studies/" + study.id());

        assertThat(today("account:1")).contains(line);
        studies.conclude(ENGINEER, study);
        assertThat(today("account:1")).doesNotContain(line);
    }

    @Test
    void anImportThatWaitsNeedsItsOwnersHandAlone() {
        UUID upload = UUID.fromString("00000000-0000-4000-8000-000000000077");
        jdbc.sql("""
                        insert into upload (site_id, upload_id, owner, file_name, uploaded_at, state, changed_at)
                        values (1, :id, 'account:77', 'glaze.csv', timestamptz '2026-03-02 10:00Z', 'waiting',
                                timestamptz '2026-03-02 10:00Z')""").param("id", upload).update();
        TodayLine line = new TodayLine(
                "studies.today.import",
                List.of("glaze.csv"),
                "studies.today.import.button",
                "/studies/import/" + upload);

        assertThat(today("account:77")).contains(line);
        assertThat(today("account:78")).doesNotContain(line);
        jdbc.sql("update upload set state = 'done' where upload_id = :id")
                .param("id", upload)
                .update();
        assertThat(today("account:77")).doesNotContain(line);
    }

    private List<TodayLine> today(String who) {
        return sources.stream()
                .flatMap(source -> source.lines(SiteId.MAIN, who).stream())
                .toList();
    }
}
