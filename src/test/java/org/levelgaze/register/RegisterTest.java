package org.levelgaze.register;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.levelgaze.journal.Actor;
import org.levelgaze.journal.Journal;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.dao.DataIntegrityViolationException;
import org.springframework.jdbc.core.simple.JdbcClient;

@SpringBootTest
@WithDatabase
class RegisterTest {

    private static final Actor SYSTEM = Actor.system(SiteId.MAIN);

    @Autowired
    Tasks tasks;

    @Autowired
    Appraisers appraisers;

    @Autowired
    Journal journal;

    @Autowired
    JdbcClient jdbc;

    @Autowired
    Clock clock;

    @Test
    void keepsATaskWithItsDefectKindsInTheirOrder() {
        List<DefectKind> kinds = List.of(
                new DefectKind("PINHOLE", "Pinhole", Severity.MINOR),
                new DefectKind("CRACK", "Crack", Severity.CRITICAL),
                new DefectKind("CRAWL", "Crawled glaze", null));

        tasks.create(SYSTEM, "REG-GLAZE", "Glaze of bowls", kinds);

        assertThat(tasks.byCode(SiteId.MAIN, "REG-GLAZE"))
                .hasValueSatisfying(task -> assertThat(task.defectKinds()).isEqualTo(kinds));
    }

    @Test
    void keepsCodesAndNamesExactlyAsWritten() {
        appraisers.create(SYSTEM, "Žofie-ß", "نور Ångström", AppraiserKind.PERSON);

        assertThat(appraisers.byCode(SiteId.MAIN, "Žofie-ß"))
                .hasValueSatisfying(one -> assertThat(one.name()).isEqualTo("نور Ångström"));
    }

    @Test
    void refusesACodeThatIsTaken() {
        tasks.create(SYSTEM, "REG-TWICE", "Once", List.of());

        assertThatThrownBy(() -> tasks.create(SYSTEM, "REG-TWICE", "Again", List.of()))
                .isInstanceOfSatisfying(Refusal.class, refusal -> {
                    assertThat(refusal.type()).isEqualTo("task-exists");
                    assertThat(refusal.arguments()).containsExactly("REG-TWICE");
                });
    }

    @Test
    void refusesCodesThatCannotBePrinted() {
        assertThatThrownBy(() -> appraisers.create(SYSTEM, "A\u0000B", "Ana", AppraiserKind.PERSON))
                .isInstanceOfSatisfying(
                        Refusal.class, refusal -> assertThat(refusal.type()).isEqualTo("code-not-usable"));
    }

    @Test
    void numbersTheConfigurationsOfACamera() {
        appraisers.create(SYSTEM, "REG-CAM", "Rim camera", AppraiserKind.CAMERA);
        Instant first = clock.instant().minus(Duration.ofDays(2));

        appraisers.addConfiguration(SYSTEM, "REG-CAM", "recipe 1", first, "");
        Appraiser camera =
                appraisers.addConfiguration(SYSTEM, "REG-CAM", "recipe 2", first.plusSeconds(60), "new lamp");

        assertThat(camera.configurations())
                .extracting(CameraConfiguration::number, CameraConfiguration::label)
                .containsExactly(
                        org.assertj.core.api.Assertions.tuple(1, "recipe 1"),
                        org.assertj.core.api.Assertions.tuple(2, "recipe 2"));
    }

    @Test
    void refusesAConfigurationOfAPersonInCodeAndInTheDatabase() {
        Appraiser person = appraisers.create(SYSTEM, "REG-ANA", "Ana", AppraiserKind.PERSON);

        assertThatThrownBy(() -> appraisers.addConfiguration(SYSTEM, "REG-ANA", "x", clock.instant(), ""))
                .isInstanceOf(Refusal.class);
        assertThatThrownBy(() -> jdbc.sql("""
                        insert into camera_configuration (site_id, appraiser_id, configuration_no, label, changed_at,
                                                          recorded_at)
                        values (1, :id, 1, 'x', now(), now())""").param("id", person.id()).update())
                .isInstanceOf(DataIntegrityViolationException.class);
    }

    @Test
    void refusesAConfigurationChangeThatLiesAhead() {
        appraisers.create(SYSTEM, "REG-CAM-2", "Foot camera", AppraiserKind.CAMERA);
        Instant ahead = clock.instant().plus(Duration.ofHours(1));

        assertThatThrownBy(() -> appraisers.addConfiguration(SYSTEM, "REG-CAM-2", "soon", ahead, ""))
                .isInstanceOfSatisfying(
                        Refusal.class, refusal -> assertThat(refusal.type()).isEqualTo("change-lies-ahead"));
    }

    @Test
    void journalsWhatWasEntered() {
        Task task = tasks.create(SYSTEM, "REG-JOURNAL", "Journalled", List.of());

        assertThat(journal.before(SiteId.MAIN, Long.MAX_VALUE, 50)).anySatisfy(entry -> {
            assertThat(entry.act()).isEqualTo("task.created");
            assertThat(entry.subject()).isEqualTo("task:" + task.id());
        });
        assertThat(journal.verify(SiteId.MAIN).intact()).isTrue();
    }
}
