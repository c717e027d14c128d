package org.levelgaze.studies.pages;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.time.LocalDate;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.levelgaze.access.Role;
import org.levelgaze.register.Severity;
import org.levelgaze.register.Task;
import org.levelgaze.register.Tasks;
import org.levelgaze.sets.Basis;
import org.levelgaze.sets.NewPiece;
import org.levelgaze.sets.NewSet;
import org.levelgaze.sets.ReferenceSet;
import org.levelgaze.sets.ReferenceSets;
import org.levelgaze.sets.TrueState;
import org.levelgaze.shared.SiteId;
import org.levelgaze.shared.Sites;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.web.context.WebApplicationContext;

@SpringBootTest
@WithDatabase
class TasksAndSetsTest {

    @Autowired
    WebApplicationContext program;

    @Test
    void entersATaskWithItsDefectKinds() {
        Visit engineer = visit(Role.QUALITY_ENGINEER);

        var entered = engineer.send(
                "/tasks",
                "code",
                "FOOT",
                "name",
                "Foot of mugs",
                "kinds",
                "CHIP; Chip at the foot; critical\n\nDRIP\n");

        assertThat(entered.getRedirectedUrl()).isEqualTo("/tasks/FOOT");
        Task task = plant().get(Tasks.class).byCode(SiteId.MAIN, "FOOT").orElseThrow();
        assertThat(task.defectKind("CHIP").orElseThrow().severity()).isEqualTo(Severity.CRITICAL);
        assertThat(task.defectKind("DRIP").orElseThrow().severity()).isNull();
        assertThat(engineer.read("/tasks/FOOT")).contains("Chip at the foot CHIP critical", "DRIP DRIP not rated yet");
        assertThat(engineer.read("/tasks")).contains("Foot of mugs FOOT Chip at the foot, DRIP");
    }

    @Test
    void aFaultInATaskStandsBesideItsFieldAndNothingTypedIsLost() {
        Visit engineer = visit(Role.QUALITY_ENGINEER);
        engineer.send("/tasks", "code", "TWICE", "name", "", "kinds", "");

        var again = engineer.send("/tasks", "code", "TWICE", "name", "Once more", "kinds", "CHIP; Chip; awful");

        assertThat(again.getStatus()).isEqualTo(422);
        assertThat(Visit.text(again)).contains("CHIP: \"awful\" is not understood. Expected: critical, major, minor.");
        String page = new String(again.getContentAsByteArray(), StandardCharsets.UTF_8);
        assertThat(page).contains("value=\"Once more\"", "CHIP; Chip; awful");
        assertThat(Visit.text(engineer.send("/tasks", "code", "TWICE", "name", "", "kinds", "")))
                .contains("There is already a task with the code \"TWICE\".");
    }

    /** Clopper and Pearson 1934: 0 misses among 2 leave up to 84 %; one of 2 is 50 % (common practice, no source). */
    @Test
    void saysWhatASetCanShow() {
        set("S BALANCE", today().minusMonths(1), 2, 48);

        assertThat(visit(Role.PROCTOR).read("/sets/S%20BALANCE"))
                .contains("Can S BALANCE be used? Yes: it is in date until")
                .contains("50 pieces: 2 defective, 48 good, 0 undecided.")
                .contains("One missed defective piece is 50 %.", "up to 84 % of such pieces get through")
                .contains("The set is unbalanced", "Nobody has opened the key")
                .doesNotContain("Show the answer key", "P-0");
    }

    @Test
    void theAnswerKeyOpensByAnActThatIsRecorded() {
        ReferenceSet set = set("S-KEY", today().minusMonths(1), 2, 2);
        Visit holder = visit(Role.HOLDER_OF_THE_STANDARD);

        assertThat(holder.read("/sets/S-KEY/key"))
                .contains("Open and record it")
                .doesNotContain("P-0");
        assertThat(plant().get(ReferenceSets.class).keyReadings(set, 1)).isEmpty();

        assertThat(holder.send("/sets/S-KEY/key").getRedirectedUrl()).isEqualTo("/sets/S-KEY/key");
        assertThat(holder.read("/sets/S-KEY/key")).contains("P-0 defective", "P-3 good");
        assertThat(holder.read("/sets/S-KEY")).contains("account:1").doesNotContain("P-0");
    }

    @Test
    void theHomePageNamesSetsThatAreOutOfDateOrSoonWillBe() {
        set("S-SOON", today().minusMonths(11), 2, 2);
        set("S-PAST", today().minusMonths(13), 2, 2);
        set("S-FRESH", today().minusMonths(1), 2, 2);

        assertThat(visit(Role.QUALITY_ENGINEER).read("/"))
                .contains("The set S-SOON (Rim) is in date until", "Plan its recalibration.")
                .contains(
                        "The set S-PAST (Rim) was in date until",
                        "Try nobody on it before its true states are confirmed.")
                .doesNotContain("S-FRESH");
    }

    private ReferenceSet set(String code, LocalDate decidedOn, int defective, int good) {
        Tasks tasks = plant().get(Tasks.class);
        Task task = tasks.byCode(SiteId.MAIN, "SET-PAGES")
                .orElseGet(() -> tasks.create(Plant.ENGINEER, "SET-PAGES", "Rim", List.of()));
        List<NewPiece> pieces = IntStream.range(0, defective + good)
                .mapToObj(i -> new NewPiece("P-" + i, i < defective ? TrueState.DEFECTIVE : TrueState.GOOD, null, null))
                .toList();
        NewSet made = new NewSet(code, decidedOn, "A. Holm", null, Basis.DECISION, pieces);
        return plant().get(ReferenceSets.class).create(Plant.ENGINEER, task, made);
    }

    private LocalDate today() {
        return plant().get(Sites.class).today(SiteId.MAIN);
    }

    private Plant plant() {
        return new Plant(program);
    }

    private Visit visit(Role role) {
        return Visit.of(program, role);
    }
}
