package org.levelgaze.studies.pages;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import org.levelgaze.access.Role;
import org.levelgaze.shared.SiteId;
import org.levelgaze.studies.Studies;
import org.levelgaze.studies.StudyHead;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.web.context.WebApplicationContext;

@SpringBootTest
@WithDatabase
class StudyPagesTest {

    private static final String TWO_PIECES = """
            piece,reference,appraiser,trial,call
            D,defective,%1$s,1,reject
            G,good,%1$s,1,accept
            D,defective,%1$s,2,accept
            G,good,%1$s,2,accept
            """;

    @Autowired
    WebApplicationContext program;

    private Plant plant() {
        return new Plant(program);
    }

    /** AIAG MSA 4th ed. (from memory): 42, 45, 40 of 50 pieces right; no one is acceptable on misses. */
    @Test
    void saysOfThePublishedStudyWhatItsBandsSay() {
        StudyHead study = plant().study("PUB", Plant.DAY, true, Plant.published());

        String page = visit(Role.PROCTOR).read("/studies/" + study.id());

        assertThat(page)
                .contains("What did the study of 2 Mar 2026 show?", "How does A judge?", "How does C judge?")
                .contains("A is not effective by the usual limits: every call right on 42 of 50 pieces (84 %)")
                .contains("3 of 48 calls on defective pieces let one through (6 %, at most 5 % is usual)")
                .contains("B is not effective by the usual limits: every call right on 45 of 50 pieces (90 %)")
                .contains("A study of 50 pieces with 84 % right leaves 70.9 % to 92.8 % open")
                .contains("not distinguishable from even")
                .contains("Only 16 defective pieces among 50: one mistake on them is 6 %.")
                .contains("Nobody has adjudicated them")
                .contains("39 of 50 78 % 64 % to 88.5 %")
                .contains("A and B 0.86")
                .doesNotContain("Chance (McNemar)");
    }

    @Test
    void writesTheSamePageInGerman() {
        StudyHead study = plant().study("DE", Plant.DAY, true, Plant.published());

        assertThat(visit(Role.AUDITOR).inGerman().read("/studies/" + study.id()))
                .contains("Was hat die Studie vom 2. März 2026 gezeigt?", "Wie urteilt A?")
                .contains("lässt 70,9 % bis 92,8 % offen");
    }

    @Test
    void theSummaryNeedsNoWordThatItsReaderHasNeverSeen() {
        StudyHead study = plant().study("SUM", Plant.DAY, true, Plant.published());

        assertThat(visit(Role.PROCTOR).read("/studies/" + study.id() + "/summary"))
                .contains("What was asked?", "What was found?", "What does that allow?")
                .contains("Each of 50 pieces of the reference set G-SUM has a known true state")
                .contains("By the usual limits not everybody here may be relied on for this task.")
                .contains("It does not prove that nothing gets out.", "Requirements of a customer")
                .doesNotContainIgnoringCase("kappa")
                .doesNotContainIgnoringCase("bias ratio");
    }

    @Test
    void anOpenStudyHasNoFindingsUntilSomebodyConcludesIt() {
        StudyHead study = plant().study("OPEN", Plant.DAY, false, TWO_PIECES.formatted("OPEN-ANA"));
        String address = "/studies/" + study.id();

        assertThat(visit(Role.QUALITY_ENGINEER).read(address))
                .contains("This study is not concluded", "Conclude the study")
                .doesNotContain("How does OPEN-ANA judge?");
        assertThat(visit(Role.AUDITOR).read(address)).doesNotContain("Conclude the study");
        assertThat(visit(Role.AUDITOR).send(address + "/conclusion").getStatus())
                .isEqualTo(403);

        assertThat(visit(Role.QUALITY_ENGINEER).send(address + "/conclusion").getRedirectedUrl())
                .isEqualTo(address);
        assertThat(plant().get(Studies.class).get(SiteId.MAIN, study.id()).concluded())
                .isTrue();
        assertThat(visit(Role.AUDITOR).read(address))
                .contains("How does OPEN-ANA judge?")
                .doesNotContain("This study is not concluded");
        assertThat(visit(Role.QUALITY_ENGINEER).send(address + "/conclusion").getStatus())
                .isEqualTo(409);
    }

    @Test
    void listsStudiesAndFiltersThem() {
        StudyHead early = plant().study("LIST", Plant.DAY, true, TWO_PIECES.formatted("LIST-ANA"));
        StudyHead late = plant().study("LIST", Plant.DAY.plusDays(40), true, TWO_PIECES.formatted("LIST-BEN"));
        Visit engineer = visit(Role.QUALITY_ENGINEER);

        assertThat(engineer.read("/studies?task=RIM-LIST"))
                .contains("2 studies", "2 Mar 2026", "11 Apr 2026", "LIST-ANA", "LIST-BEN", "Import a study");
        assertThat(engineer.read("/studies?appraiser=LIST-BEN"))
                .contains("One study", "11 Apr 2026")
                .doesNotContain("2 Mar 2026");
        assertThat(engineer.read("/studies?task=RIM-LIST&from=2026-03-03")).contains("One study", "11 Apr 2026");
        assertThat(engineer.read("/studies?set=G-LIST&to=2026-03-02&from=")).contains("One study", "2 Mar 2026");
        assertThat(engineer.read("/studies?task=NO-SUCH")).contains("No study matches. Loosen a filter.");
        assertThat(engineer.read("/studies/" + early.id())).isNotEqualTo(engineer.read("/studies/" + late.id()));
    }

    @Test
    void aStudyThatIsNotThereIsNamed() {
        assertThat(visit(Role.AUDITOR).read("/studies/987654321"))
                .contains("There is no study with the number 987654321.");
    }

    private Visit visit(Role role) {
        return Visit.of(program, role);
    }
}
