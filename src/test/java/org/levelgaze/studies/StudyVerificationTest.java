package org.levelgaze.studies;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayInputStream;
import java.nio.charset.StandardCharsets;
import java.sql.Connection;
import java.sql.SQLException;
import java.sql.Statement;
import java.time.LocalDate;
import java.util.List;
import javax.sql.DataSource;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInfo;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.Tasks;
import org.levelgaze.shared.SiteId;
import org.levelgaze.studies.StudyVerification.Difference;
import org.levelgaze.studies.StudyVerification.What;
import org.levelgaze.studies.reading.CallReader;
import org.levelgaze.studies.reading.Reading;
import org.levelgaze.studies.reading.Watcher;
import org.levelgaze.testing.SharedPostgres;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;

@SpringBootTest
@WithDatabase
class StudyVerificationTest {

    private static final Actor ENGINEER = new Actor(SiteId.MAIN, "account:7");

    @Autowired
    StudyVerification verification;

    @Autowired
    StudyImport imports;

    @Autowired
    Tasks tasks;

    @Autowired
    DataSource database;

    private long study;

    @BeforeEach
    void aStudy(TestInfo test) throws Exception {
        String name = "V-" + test.getTestMethod().orElseThrow().getName();
        tasks.create(ENGINEER, name, name, List.of());
        String file = "piece,reference,appraiser,trial,call\n1,good,%1$s,1,accept\n2,defective,%1$s,1,accept\n"
                .formatted(name);
        Reading reading = CallReader.standard().read(new ByteArrayInputStream(file.getBytes(StandardCharsets.UTF_8)));
        StudyRequest request =
                new StudyRequest(name, name, LocalDate.of(2026, 2, 3), null, true, "", Consent.EVERYTHING_NEW);
        ImportOutcome outcome = imports.take(ENGINEER, request, ((Reading.Read) reading).calls(), Watcher.NONE);
        study = ((ImportOutcome.Stored) outcome).study().id();
    }

    @Test
    void findsNothingWhereEverythingFollowsFromTheFacts() {
        assertThat(differences()).isEmpty();
    }

    @Test
    void namesAStudyWhoseCallsWereChangedBehindTheProgram() throws SQLException {
        asOwner("update study_call set accepted = not accepted where study_id = " + study);

        assertThat(differences()).containsExactly(new Difference(study, What.FINDINGS));
    }

    @Test
    void namesAStudyWhoseCallsWereTakenAway() throws SQLException {
        asOwner("delete from study_call where piece_no = 1 and study_id = " + study);

        assertThat(differences()).containsExactly(new Difference(study, What.CALLS));
    }

    @Test
    void namesAStudyWhoseFiguresWereChanged() throws SQLException {
        asOwner("update appraiser_figure set false_accepts = 0 where study_id = " + study);

        assertThat(differences()).containsExactly(new Difference(study, What.FIGURES));
    }

    @Test
    void namesAConcludedStudyWithoutFindings() throws SQLException {
        asOwner(
                "delete from appraiser_figure where study_id = " + study,
                "delete from finding where study_id = " + study);

        assertThat(differences()).containsExactly(new Difference(study, What.FINDINGS_MISSING));
    }

    private List<Difference> differences() {
        return verification.verify(SiteId.MAIN).differences().stream()
                .filter(difference -> difference.study() == study)
                .toList();
    }

    /** The owner of the tables can do what the program cannot. */
    private void asOwner(String... statements) throws SQLException {
        try (Connection pooled = database.getConnection();
                Connection owner = SharedPostgres.owner(pooled.getMetaData().getURL());
                Statement statement = owner.createStatement()) {
            for (String sql : statements) {
                statement.execute(sql);
            }
        }
    }
}
