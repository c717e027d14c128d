package org.levelgaze.studies.pages;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.time.LocalDate;
import org.junit.jupiter.api.Test;
import org.levelgaze.access.Role;
import org.levelgaze.access.Scope;
import org.levelgaze.register.AppraiserKind;
import org.levelgaze.register.Appraisers;
import org.levelgaze.shared.SiteId;
import org.levelgaze.studies.StudyHead;
import org.levelgaze.testing.As;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.web.context.WebApplicationContext;

@SpringBootTest
@WithDatabase
class AppraiserPagesTest {

    private static final String CALLS = """
            piece,reference,appraiser,trial,call
            D1,defective,%1$s,1,reject
            D2,defective,%1$s,1,%2$s
            G1,good,%1$s,1,accept
            G2,good,%1$s,1,%3$s
            """;

    @Autowired
    WebApplicationContext program;

    @Test
    void showsEveryFigureFromStudyToStudyWithATableOfItsNumbers() {
        plant().study("TREND", LocalDate.of(2025, 3, 2), true, CALLS.formatted("TREND-ANA", "accept", "accept"));
        plant().study("TREND", LocalDate.of(2026, 3, 2), true, CALLS.formatted("TREND-ANA", "reject", "reject"));
        plant().study("TREND", LocalDate.of(2026, 9, 2), true, CALLS.formatted("TREND-ANA", "reject", "accept"));

        assertThat(visit(Role.PROCTOR).read("/appraisers/TREND-ANA"))
                .contains("How does TREND-ANA judge over time?", "Rim of mugs TREND")
                .contains("Newest study, 2 Sep 2026: every call right on 4 of 4 pieces.")
                .contains("Pieces right in every trial", "Defective pieces let through", "Good pieces refused")
                .contains("Both kinds of mistake at once", "Show as a table")
                .contains("2 Mar 2025 0.00 0.00 to", "2 Mar 2026 none let through", "2 Sep 2026 no mistake")
                .doesNotContain("What did the camera judge with?");
        assertThat(visit(Role.PROCTOR).read("/appraisers"))
                .contains("TREND-ANA TREND-ANA person 2 Sep 2026 : right on 4 of 4 pieces (100 %) no mistake");
    }

    @Test
    void answersTheTrendOverTheApi() {
        StudyHead study = plant().study("TRAPI", Plant.DAY, true, CALLS.formatted("TRAPI-ANA", "reject", "reject"));
        Visit line = Visit.of(program, As.program(Scope.READ));

        assertThat(line.read("/api/v1/appraisers/TRAPI-ANA/trend?task=RIM-TRAPI"))
                .startsWith(
                        "{\"appraiser\":\"TRAPI-ANA\",\"task\":\"RIM-TRAPI\",\"points\":[{\"study\":" + study.id()
                                + ",\"when\":\"2026-03-02\",\"effectiveness\":{\"k\":3,\"n\":4,\"value\":0.75,\"clopperPearson\":[")
                .contains("\"biasRatio\":null,\"criterionC\":-0.48");
        assertThat(line.open("/api/v1/appraisers/NOBODY/trend?task=RIM-TRAPI").getStatus())
                .isEqualTo(404);
        assertThat(line.open("/api/v1/appraisers/TRAPI-ANA/trend").getStatus()).isEqualTo(400);
    }

    @Test
    void entersAPersonAndKeepsWhatWasTypedWhenItCannot() {
        Visit engineer = visit(Role.QUALITY_ENGINEER);

        assertThat(engineer.send("/appraisers", "code", "FORM-EVA", "name", "Eva Tarn", "kind", "PERSON")
                        .getRedirectedUrl())
                .isEqualTo("/appraisers/FORM-EVA");
        assertThat(engineer.read("/appraisers/FORM-EVA")).contains("There is no concluded study of Eva Tarn yet.");

        var again = engineer.send("/appraisers", "code", "FORM-EVA", "name", "Eva Holm", "kind", "CAMERA");
        assertThat(again.getStatus()).isEqualTo(422);
        assertThat(new String(again.getContentAsByteArray(), StandardCharsets.UTF_8))
                .contains("There is already an appraiser with the code &quot;FORM-EVA&quot;", "value=\"Eva Holm\"")
                .containsPattern("aria-invalid=\"true\"[^>]*id=\"code\"")
                .containsPattern("value=\"CAMERA\" selected");
        assertThat(visit(Role.AUDITOR).read("/appraisers")).doesNotContain("Enter a person or a camera");
    }

    @Test
    void aCamerasConfigurationsAreALadderWithTheStudiesMadeWithEach() {
        Appraisers appraisers = plant().get(Appraisers.class);
        appraisers.create(Plant.ENGINEER, "RUNG-CAM", "Rim camera", AppraiserKind.CAMERA);
        plant().study("RUNG", LocalDate.of(2025, 1, 10), true, CALLS.formatted("RUNG-CAM", "accept", "accept"));
        appraisers.addConfiguration(
                Plant.ENGINEER, "RUNG-CAM", "recipe 7", Instant.parse("2025-06-01T10:00:00Z"), "new light");
        plant().study("RUNG", LocalDate.of(2025, 7, 10), true, CALLS.formatted("RUNG-CAM", "reject", "accept"));

        assertThat(visit(Role.AUDITOR).read("/appraisers/RUNG-CAM"))
                .contains("What did the camera judge with?")
                .containsPattern("recipe 7 in force since .*2025.* new light Study of 10 Jul 2025"
                        + " Before the first configuration Study of 10 Jan 2025");
    }

    @Test
    void entersAConfigurationAndNamesTheFieldThatIsWrong() {
        plant().get(Appraisers.class).create(Plant.ENGINEER, "CONF-CAM", "Foot camera", AppraiserKind.CAMERA);
        Visit engineer = visit(Role.QUALITY_ENGINEER);
        String address = "/appraisers/CONF-CAM/configurations";

        assertThat(engineer.send(address, "label", "recipe 1", "changedAt", "2025-06-01T10:00", "note", "")
                        .getRedirectedUrl())
                .isEqualTo("/appraisers/CONF-CAM");
        assertThat(plant().get(Appraisers.class)
                        .byCode(SiteId.MAIN, "CONF-CAM")
                        .orElseThrow()
                        .configurations())
                .hasSize(1);
        assertThat(Visit.text(engineer.send(address, "label", "recipe 1", "changedAt", "2025-07-01T10:00", "note", "")))
                .contains("The camera \"CONF-CAM\" already has a configuration called \"recipe 1\".");
        assertThat(Visit.text(engineer.send(address, "label", "recipe 2", "changedAt", "soon", "note", "")))
                .contains("Give the day and the time of the change.");
        assertThat(Visit.text(engineer.send(address, "label", "recipe 2", "changedAt", "2999-07-01T10:00", "note", "")))
                .contains("lies ahead");
    }

    private Plant plant() {
        return new Plant(program);
    }

    private Visit visit(Role role) {
        return Visit.of(program, role);
    }
}
