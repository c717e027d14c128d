package org.levelgaze.studies.importing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.security.test.web.servlet.setup.SecurityMockMvcConfigurers.springSecurity;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;

import java.io.UnsupportedEncodingException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInfo;
import org.levelgaze.access.Role;
import org.levelgaze.journal.Actor;
import org.levelgaze.journal.Journal;
import org.levelgaze.register.AppraiserKind;
import org.levelgaze.register.Appraisers;
import org.levelgaze.register.Task;
import org.levelgaze.register.Tasks;
import org.levelgaze.sets.ReferenceSets;
import org.levelgaze.shared.SiteId;
import org.levelgaze.testing.As;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.http.HttpStatus;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.mock.web.MockMultipartFile;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import org.springframework.test.web.servlet.assertj.MvcTestResult;
import org.springframework.test.web.servlet.setup.MockMvcBuilders;
import org.springframework.util.LinkedMultiValueMap;
import org.springframework.util.MultiValueMap;
import org.springframework.web.context.WebApplicationContext;

@SpringBootTest
@WithDatabase
class ImportPagesTest {

    private static final Actor ENGINEER = new Actor(SiteId.MAIN, "account:1");

    @Autowired
    WebApplicationContext context;

    @Autowired
    Tasks tasks;

    @Autowired
    ReferenceSets sets;

    @Autowired
    Appraisers appraisers;

    @Autowired
    Journal journal;

    @Autowired
    JdbcClient jdbc;

    private MockMvcTester pages = MockMvcTester.of();
    private String code = "";

    @BeforeEach
    void open(TestInfo test) {
        code = test.getTestMethod().orElseThrow().getName();
        pages = MockMvcTester.create(MockMvcBuilders.webAppContextSetup(context)
                .apply(springSecurity())
                .defaultRequest(get("/").with(As.person(Role.QUALITY_ENGINEER))
                        .with(csrf())
                        .locale(Locale.ENGLISH))
                .build());
    }

    @Test
    void takesAFileFromTheFormToAStoredStudyOnAFreshPlant() {
        String upload = bring("calls.csv", longFile("ANA"));

        assertThat(show(upload)).hasStatusOk().bodyText().contains("What does this file say?", "P-1", "A new task");
        MvcTestResult asked = follow(order(upload, newTaskAndSet()));
        assertThat(asked).bodyText().contains("May these be entered?", code + "-ANA is", "a new person");
        assertThat(appraisers.byCode(SiteId.MAIN, code + "-ANA")).isEmpty();
        assertThat(tasks.byCode(SiteId.MAIN, code)).isEmpty();

        MvcTestResult stored = follow(answers(upload, "person"));

        assertThat(stored.getResponse().getRedirectedUrl()).matches("/studies/\\d+");
        assertThat(appraisers.byCode(SiteId.MAIN, code + "-ANA"))
                .hasValueSatisfying(one -> assertThat(one.kind()).isEqualTo(AppraiserKind.PERSON));
        assertThat(sets.byCode(SiteId.MAIN, code + "-S")).isPresent();
        assertThat(callsOf(stored)).isEqualTo(2);
    }

    @Test
    void takesAWideFileWithOneColumnForEachAppraiserAndTrial() {
        known("ANA", "BENGT");
        String upload = bring(
                "wide.csv",
                "piece,reference,%1$s-ANA 1,%1$s-ANA 2,%1$s-BENGT 1\nP-1,good,ok,nok,ok\nP-2,bad,nok,ok,nok\n"
                        .formatted(code));
        assertThat(show(upload)).bodyText().contains("value=\"" + code + "-BENGT\"");
        MultiValueMap<String, String> form = newTaskAndSet();
        form.remove("columns[4].role");
        column(form, 2, "call", code + "-ANA", "1");
        column(form, 3, "call", code + "-ANA", "2");
        column(form, 4, "call", code + "-BENGT", "1");
        words(form, "callWords", "ok", "accept", "nok", "reject");
        words(form, "truthWords", "good", "good", "bad", "defective");

        MvcTestResult stored = follow(order(upload, form));

        assertThat(callsOf(stored)).isEqualTo(6);
    }

    @Test
    void asksWhatOneAndZeroMeanAndNeverGuesses() {
        known("ANA");
        String upload =
                bring("digits.csv", longFile("ANA").replace("accept", "1").replace("reject", "0"));
        assertThat(show(upload))
                .bodyText()
                .contains("never guessed", "<code>1</code>", "<code>0</code>")
                .doesNotContain("value=\"accept\" selected");
        MultiValueMap<String, String> form = newTaskAndSet();
        words(form, "callWords", "1", "", "0", "reject");

        MvcTestResult open = order(upload, form);

        assertThat(open).hasStatus(HttpStatus.UNPROCESSABLE_CONTENT);
        assertThat(open)
                .bodyText()
                .contains("Say what &quot;1&quot; means.", "One answer is missing", "value=\"" + code + "-S\"");
        words(form, "callWords", "1", "accept", "0", "reject");
        assertThat(follow(order(upload, form)).getResponse().getRedirectedUrl()).matches("/studies/\\d+");
    }

    @Test
    void namesEachAnswerThatIsMissingBesideItsFieldAndKeepsTheOthers() {
        tasks.create(ENGINEER, code, code, List.of());
        String upload = bring("calls.csv", longFile("ANA"));
        MultiValueMap<String, String> form = newTaskAndSet();
        form.set("newTaskName", "Glaze of the rim");
        form.set("newSetCode", " ");
        form.set("performedOn", "2999-01-01");
        form.set("columns[0].role", "");
        form.set("columns[2].role", "");

        MvcTestResult faults = order(upload, form);

        assertThat(faults).hasStatus(HttpStatus.UNPROCESSABLE_CONTENT);
        assertThat(faults)
                .bodyText()
                .contains(
                        "There is a task " + code + " already.",
                        "Give the new set a code.",
                        "This day lies ahead.",
                        "Which column names the piece?",
                        "Whose calls are in &quot;call&quot;?",
                        "value=\"Glaze of the rim\"",
                        "5 answers are missing");
    }

    @Test
    void showsEveryBadRowWithWhatWasExpectedAndStoresNothing() {
        known("ANA");
        StringBuilder file = new StringBuilder("piece,reference,appraiser,trial,call\n");
        file.append("P-0,good,").append(code).append("-ANA,1,accept\n");
        for (int row = 1; row <= 250; row++) {
            file.append("P-").append(row).append(",good,").append(code).append("-ANA,=1+1,accept\n");
        }
        String upload = bring("bad.csv", file.toString());

        MvcTestResult refused = follow(order(upload, newTaskAndSet()));

        assertThat(refused)
                .bodyText()
                .contains("250 rows cannot be taken", "200 of 250 such rows are shown", "Download all 250 rows")
                .contains("trial &#39;=1+1&#39; is not a whole number");
        assertThat(tasks.byCode(SiteId.MAIN, code)).isEmpty();
        String csv = body(
                pages.get().uri("/studies/import/{id}/bad-rows.csv", upload).exchange());
        assertThat(csv.lines()).hasSize(251).element(250).asString().startsWith("252,trial,'=1+1,trial '=1+1'");
    }

    @Test
    void listsEveryPieceThatDoesNotFitAKnownSetInTheDownload() {
        known("ANA");
        String first = bring("first.csv", longFile("ANA"));
        follow(order(first, newTaskAndSet()));
        StringBuilder file = new StringBuilder("piece,reference,appraiser,trial,call\n");
        for (int row = 1; row <= 210; row++) {
            file.append("X-").append(row).append(",good,").append(code).append("-ANA,1,accept\n");
        }
        String upload = bring("second.csv", file.toString());

        MvcTestResult refused = follow(order(upload, knownTaskAndSet()));

        assertThat(refused).bodyText().contains("does not fit the set", "200 of 210 such rows are shown");
        String csv = body(
                pages.get().uri("/studies/import/{id}/bad-rows.csv", upload).exchange());
        assertThat(csv.lines()).hasSize(211);
    }

    @Test
    void asksForTheWordsThatStoodInBadRows() {
        known("ANA");
        StringBuilder file = new StringBuilder("piece,reference,appraiser,trial,call\n");
        for (int row = 0; row < 6000; row++) {
            file.append("P-").append(row).append(",good,").append(code).append("-ANA,1,");
            file.append(row == 5900 ? "meh\n" : row == 5901 ? "reject\n" : "accept\n");
        }
        String upload = bring("late.csv", file.toString());

        MvcTestResult refused = follow(order(upload, newTaskAndSet()));

        assertThat(refused)
                .bodyText()
                .contains("Row", "One row cannot be taken", "<code>meh</code> <span>means</span>");
    }

    @Test
    void remembersForTheTaskWhatColumnsAndWordsMean() {
        known("ANA");
        String odd = longFile("ANA")
                .replace("appraiser", "wer")
                .replace("accept", "1")
                .replace("reject", "0");
        MultiValueMap<String, String> form = newTaskAndSet();
        words(form, "callWords", "1", "reject", "0", "accept");
        follow(order(bring("first.csv", odd), form));
        Task task = tasks.byCode(SiteId.MAIN, code).orElseThrow();
        String next = bring("next.csv", odd + "P-9,good," + code + "-ANA,1,1\n");
        MultiValueMap<String, String> choice = new LinkedMultiValueMap<>();
        choice.set("task", Long.toString(task.id()));
        choice.set("look", "");

        MvcTestResult looked = order(next, choice);

        assertThat(looked).hasStatusOk();
        assertThat(body(looked).replaceAll("\\s+", " "))
                .contains("<code>1</code> <span>means</span>", "value=\"reject\" selected", code + "-S</option>")
                .contains("value=\"appraiser\" selected");
        assertThat(journal.before(SiteId.MAIN, Long.MAX_VALUE, 200))
                .filteredOn(entry -> entry.subject().equals("task:" + task.id()))
                .extracting(entry -> entry.act())
                .contains("import-mapping.saved");
    }

    @Test
    void asksBeforeItStoresTheSameFileASecondTime() {
        known("ANA");
        follow(order(bring("once.csv", longFile("ANA")), newTaskAndSet()));
        String again = bring("twice.csv", longFile("ANA"));

        MvcTestResult asked = follow(order(again, knownTaskAndSet()));

        assertThat(asked).bodyText().contains("Was this file stored before?", "study ");
        assertThat(post("/studies/import/" + again + "/answers", new LinkedMultiValueMap<>()))
                .hasStatus(HttpStatus.UNPROCESSABLE_CONTENT)
                .bodyText()
                .contains("Say yes to store it once more");
        MultiValueMap<String, String> yes = new LinkedMultiValueMap<>();
        yes.set("repeat", "yes");
        MvcTestResult stored = follow(post("/studies/import/" + again + "/answers", yes));
        assertThat(stored.getResponse().getRedirectedUrl()).matches("/studies/\\d+");
    }

    @Test
    void keepsWhatWasSaidWhenASlipOfThePenIsCorrected() {
        String wrong = bring("wrong.csv", longFile("ANNA"));
        follow(order(wrong, newTaskAndSet()));

        MvcTestResult slip = answers(wrong, "slip");

        String bringAgain = Objects.requireNonNull(slip.getResponse().getRedirectedUrl());
        assertThat(bringAgain).isEqualTo("/studies/import?instead=" + wrong);
        assertThat(appraisers.byCode(SiteId.MAIN, code + "-ANNA")).isEmpty();
        MvcTestResult brought = pages.post()
                .uri("/studies/import")
                .multipart()
                .file(file("right.csv", longFile("ANA")))
                .param("instead", wrong)
                .exchange();
        assertThat(follow(brought)).bodyText().contains("right.csv", "value=\"" + code + "-S\"", "2026-03-02");
        assertThat(show(wrong)).hasStatus(HttpStatus.NOT_FOUND);
    }

    @Test
    void storesOneStudyOfTwoClicksAtOnce() throws Exception {
        known("ANA");
        String upload = bring("double.csv", longFile("ANA"));
        Callable<MvcTestResult> click = () -> order(upload, newTaskAndSet());
        ExecutorService two = Executors.newFixedThreadPool(2);
        try {
            for (Future<MvcTestResult> one : two.invokeAll(List.of(click, click))) {
                assertThat(follow(one.get()).getResponse().getRedirectedUrl()).matches("/studies/\\d+");
            }
        } finally {
            two.shutdown();
        }

        long task = tasks.byCode(SiteId.MAIN, code).orElseThrow().id();
        assertThat(jdbc.sql("select count(*) from study where task_id = ?")
                        .param(task)
                        .query(Integer.class)
                        .single())
                .isEqualTo(1);
    }

    @Test
    void showsAnImportToNobodyElse() {
        String upload = bring("mine.csv", longFile("ANA"));
        jdbc.sql("update upload set owner = 'account:99' where upload_id = ?::uuid")
                .param(upload)
                .update();

        assertThat(show(upload)).hasStatus(HttpStatus.NOT_FOUND).bodyText().contains("There is no such import");
    }

    @Test
    void refusesWhatIsNoTextAtTheDoor() {
        byte[] zip = {'P', 'K', 3, 4, 0, 0, 0, 0};
        MvcTestResult refused = pages.post()
                .uri("/studies/import")
                .multipart()
                .file(new MockMultipartFile("file", "bomb.zip", null, zip))
                .exchange();

        assertThat(refused)
                .hasStatus(HttpStatus.UNPROCESSABLE_CONTENT)
                .bodyText()
                .contains("packed", "zip");
    }

    @Test
    void listsWhatWasLeftUnfinishedAndLetsItBeTakenAway() {
        String upload = bring(code + ".csv", longFile("ANA"));
        assertThat(pages.get().uri("/studies/import")).bodyText().contains(code + ".csv", "waits for you to say");

        post("/studies/import/" + upload + "/away", new LinkedMultiValueMap<>());

        assertThat(pages.get().uri("/studies/import")).bodyText().doesNotContain(code + ".csv");
    }

    @Test
    void offersExamplesThatItWouldTakeItself() {
        for (String shape : List.of("long", "wide")) {
            String example = body(
                    pages.get().uri("/studies/import/example-" + shape + ".csv").exchange());
            String upload = bring(shape + ".csv", example);
            assertThat(show(upload)).bodyText().contains("P-01", "value=\"piece\" selected", "value=\"call\" selected");
        }
    }

    private void known(String... names) {
        for (String name : names) {
            appraisers.create(ENGINEER, code + "-" + name, code + "-" + name, AppraiserKind.PERSON);
        }
    }

    private String longFile(String appraiser) {
        return "piece,reference,appraiser,trial,call\nP-1,good,%1$s-%2$s,1,accept\nP-2,defective,%1$s-%2$s,1,reject\n"
                .formatted(code, appraiser);
    }

    private MultiValueMap<String, String> newTaskAndSet() {
        MultiValueMap<String, String> form = answersToColumns();
        form.set("task", "new");
        form.set("newTaskCode", code);
        form.set("newTaskName", "Task of " + code);
        form.set("set", "new");
        form.set("newSetCode", code + "-S");
        return form;
    }

    private MultiValueMap<String, String> knownTaskAndSet() {
        MultiValueMap<String, String> form = answersToColumns();
        long task = tasks.byCode(SiteId.MAIN, code).orElseThrow().id();
        form.set("task", Long.toString(task));
        form.set("mappedTask", Long.toString(task));
        form.set(
                "set",
                Long.toString(
                        sets.byCode(SiteId.MAIN, code + "-S").orElseThrow().id()));
        return form;
    }

    private static MultiValueMap<String, String> answersToColumns() {
        MultiValueMap<String, String> form = new LinkedMultiValueMap<>();
        form.set("mappedTask", "new");
        form.set("performedOn", "2026-03-02");
        int at = 0;
        for (String role : List.of("piece", "reference", "appraiser", "trial", "call")) {
            column(form, at++, role, "", "");
        }
        words(form, "callWords", "accept", "accept", "reject", "reject");
        words(form, "truthWords", "good", "good", "defective", "defective");
        return form;
    }

    private static void column(MultiValueMap<String, String> form, int at, String role, String whose, String trial) {
        form.set("columns[" + at + "].role", role);
        form.set("columns[" + at + "].appraiser", whose);
        form.set("columns[" + at + "].trial", trial);
    }

    private static void words(MultiValueMap<String, String> form, String list, String... wordsAndMeanings) {
        for (int at = 0; at < wordsAndMeanings.length / 2; at++) {
            form.set(list + "[" + at + "].word", wordsAndMeanings[2 * at]);
            form.set(list + "[" + at + "].meaning", wordsAndMeanings[2 * at + 1]);
        }
    }

    private static MockMultipartFile file(String name, String content) {
        return new MockMultipartFile("file", name, "text/csv", content.getBytes(StandardCharsets.UTF_8));
    }

    private String bring(String name, String content) {
        MvcTestResult brought = pages.post()
                .uri("/studies/import")
                .multipart()
                .file(file(name, content))
                .exchange();
        String place = Objects.requireNonNull(brought.getResponse().getRedirectedUrl(), () -> body(brought));
        return place.substring(place.lastIndexOf('/') + 1);
    }

    private MvcTestResult order(String upload, MultiValueMap<String, String> form) {
        return post("/studies/import/" + upload, form);
    }

    private MvcTestResult answers(String upload, String kind) {
        MultiValueMap<String, String> form = new LinkedMultiValueMap<>();
        form.set("appraisers[0].kind", kind);
        return post("/studies/import/" + upload + "/answers", form);
    }

    private MvcTestResult post(String place, MultiValueMap<String, String> form) {
        return pages.post().uri(place).formFields(form).exchange();
    }

    private MvcTestResult show(String upload) {
        return pages.get().uri("/studies/import/" + upload).exchange();
    }

    /** Where a form leads, once a run that it has started is through. */
    private MvcTestResult follow(MvcTestResult redirect) {
        String place = Objects.requireNonNull(redirect.getResponse().getRedirectedUrl(), () -> body(redirect));
        MvcTestResult shown = pages.get().uri(place).exchange();
        while (body(shown).contains("hx-trigger=\"every 1s\"")) {
            Thread.onSpinWait();
            shown = pages.get().uri(place).exchange();
        }
        return shown;
    }

    private int callsOf(MvcTestResult stored) {
        String place = Objects.requireNonNull(stored.getResponse().getRedirectedUrl(), () -> body(stored));
        return jdbc.sql("select count(*) from study_call where study_id = ?")
                .param(Long.parseLong(place.substring(place.lastIndexOf('/') + 1)))
                .query(Integer.class)
                .single();
    }

    private static String body(MvcTestResult result) {
        try {
            return result.getResponse().getContentAsString(StandardCharsets.UTF_8);
        } catch (UnsupportedEncodingException e) {
            throw new IllegalStateException(e);
        }
    }
}
