package org.levelgaze.studies;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.time.Duration;
import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneId;
import java.util.List;
import java.util.Map;
import java.util.concurrent.Callable;
import java.util.concurrent.CancellationException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.assertj.core.api.ThrowableAssert.ThrowingCallable;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInfo;
import org.levelgaze.agreement.Engine;
import org.levelgaze.agreement.Terms;
import org.levelgaze.journal.Actor;
import org.levelgaze.journal.Journal;
import org.levelgaze.register.AppraiserKind;
import org.levelgaze.register.Appraisers;
import org.levelgaze.register.Task;
import org.levelgaze.register.Tasks;
import org.levelgaze.sets.Basis;
import org.levelgaze.sets.Edition;
import org.levelgaze.sets.KeyReading;
import org.levelgaze.sets.NewPiece;
import org.levelgaze.sets.NewSet;
import org.levelgaze.sets.ReferenceSet;
import org.levelgaze.sets.ReferenceSets;
import org.levelgaze.sets.TrueState;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.levelgaze.shared.Sites;
import org.levelgaze.studies.reading.CallReader;
import org.levelgaze.studies.reading.Reading;
import org.levelgaze.studies.reading.RecordedCalls;
import org.levelgaze.studies.reading.Watcher;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.jdbc.core.simple.JdbcClient;

@SpringBootTest
@WithDatabase
class StudyImportTest {

    private static final Actor ENGINEER = new Actor(SiteId.MAIN, "account:7");
    private static final LocalDate DAY = LocalDate.of(2026, 3, 2);

    @Autowired
    StudyImport imports;

    @Autowired
    Studies studies;

    @Autowired
    Tasks tasks;

    @Autowired
    Appraisers appraisers;

    @Autowired
    ReferenceSets sets;

    @Autowired
    Sites sites;

    @Autowired
    Journal journal;

    @Autowired
    JdbcClient jdbc;

    private Task task;
    private String set = "";
    private String ana = "";

    @BeforeEach
    void aTaskAndNamesOfItsOwn(TestInfo test) {
        String name = test.getTestMethod().orElseThrow().getName();
        task = tasks.create(ENGINEER, "T-" + name, name, List.of());
        set = "S-" + name;
        ana = "ANA-" + name;
    }

    @Test
    void storesEveryCallOnceAndWhatItShows() {
        RecordedCalls calls = read("""
                piece,reference,appraiser,trial,call
                1,good,%1$s,1,accept
                2,defective,%1$s,1,reject
                1,good,%1$s,2,accept
                2,defective,%1$s,2,accept
                """.formatted(ana));

        StudyHead study = stored(imports.take(ENGINEER, request(Consent.EVERYTHING_NEW), calls, Watcher.NONE));

        assertThat(study.calls()).isEqualTo(4);
        assertThat(study.callsMissing()).isZero();
        assertThat(studies.findings(study))
                .hasValue(Engine.assess(studies.forEngine(study), Terms.STANDARD))
                .hasValueSatisfying(findings -> assertThat(
                                findings.appraisers().get(0).falseAccept().k())
                        .isEqualTo(1));
    }

    @Test
    void readsBackExactlyTheCallsThatWereStored() {
        RecordedCalls calls = read("""
                piece,reference,appraiser,trial,call,defect,seen
                p3,defective,%1$s,1,reject,crack,dent
                p1,good,%1$s,1,,,
                p2,defective,%1$s,1,accept,dent,
                p1,good,B-%1$s,1,reject,,crack
                p1,good,%1$s,2,accept,,
                """.formatted(ana));

        StudyHead study = stored(imports.take(ENGINEER, request(Consent.EVERYTHING_NEW), calls, Watcher.NONE));

        assertThat(Engine.assess(studies.forEngine(study), Terms.STANDARD))
                .isEqualTo(Engine.assess(calls.toStudy(), Terms.STANDARD));
        assertThat(study.callsMissing()).isEqualTo(3 * 2 + 3 * 1 - 4);
    }

    @Test
    void asksBeforeItMakesANewPersonOrANewSet() {
        RecordedCalls calls = read(twoPieces(ana, "accept"));

        ImportOutcome outcome = imports.take(ENGINEER, request(Consent.NOTHING), calls, Watcher.NONE);

        assertThat(outcome).isEqualTo(new ImportOutcome.Asked(true, List.of(ana), List.of(), null));
        assertThat(appraisers.byCode(SiteId.MAIN, ana)).isEmpty();
        assertThat(sets.byCode(SiteId.MAIN, set)).isEmpty();
    }

    @Test
    void entersAnUnknownAppraiserAsTheKindThatTheUserSaid() {
        Consent consent = new Consent(true, true, false, Map.of(ana, AppraiserKind.CAMERA), false);

        imports.take(ENGINEER, request(consent), read(twoPieces(ana, "accept")), Watcher.NONE);

        assertThat(appraisers.byCode(SiteId.MAIN, ana))
                .hasValueSatisfying(one -> assertThat(one.kind()).isEqualTo(AppraiserKind.CAMERA));
    }

    @Test
    void marksTheTrueStatesOfAnImportAsNotAdjudicated() {
        take(request(Consent.EVERYTHING_NEW), twoPieces(ana, "accept"));

        Edition edition = sets.newest(sets.byCode(SiteId.MAIN, set).orElseThrow());
        assertThat(edition.basis()).isEqualTo(Basis.IMPORT);
        assertThat(edition.decidedOn()).isEqualTo(DAY);
        assertThat(edition.validUntil()).isEqualTo(DAY.plusMonths(12));
    }

    @Test
    void findsAppraisersByCodeAndThenByName() {
        appraisers.create(ENGINEER, ana, "Ana Holm of " + ana, AppraiserKind.PERSON);

        StudyHead study =
                take(new Consent(true, true, false, Map.of(), false), twoPieces("Ana Holm of " + ana, "accept"));

        assertThat(studies.codes(study)).containsExactly(ana);
    }

    @Test
    void refusesANameThatTwoAppraisersShare() {
        appraisers.create(ENGINEER, ana + "-1", "Twin " + ana, AppraiserKind.PERSON);
        appraisers.create(ENGINEER, ana + "-2", "Twin " + ana, AppraiserKind.PERSON);

        assertRefused("two-of-one-name", () -> take(Consent.EVERYTHING_NEW, twoPieces("Twin " + ana, "accept")));
    }

    @Test
    void takesTheTrueStatesOfAKnownSetWhenTheFileHasNone() {
        knownSet();

        StudyHead study = take(Consent.EVERYTHING_NEW, "piece,appraiser,trial,call\nD,%s,1,accept\n".formatted(ana));

        assertThat(studies.findings(study)
                        .orElseThrow()
                        .appraisers()
                        .get(0)
                        .falseAccept()
                        .k())
                .isEqualTo(1);
    }

    @Test
    void storesTheCallsOnAGreyPieceAndDoesNotScoreThem() {
        knownSet();

        StudyHead study = take(
                Consent.EVERYTHING_NEW,
                "piece,appraiser,trial,call\nG,%1$s,1,accept\nU,%1$s,1,reject\n".formatted(ana));

        assertThat(study.calls()).isEqualTo(2);
        assertThat(studies.findings(study).orElseThrow().appraisers().get(0).calls())
                .isEqualTo(1);
    }

    @Test
    void makesAGreyPieceOfASetFromAFileThatSaysSo() {
        StudyHead study = take(
                Consent.EVERYTHING_NEW,
                "piece,reference,appraiser,trial,call\n1,grey,%1$s,1,accept\n2,good,%1$s,1,accept\n".formatted(ana));

        assertThat(sets.newest(sets.byCode(SiteId.MAIN, set).orElseThrow()).grey())
                .isEqualTo(1);
        assertThat(studies.findings(study).orElseThrow().study().pieces()).isEqualTo(1);
    }

    @Test
    void namesEveryPieceThatDoesNotFitTheSet() {
        knownSet();
        String file =
                "piece,reference,appraiser,trial,call\nD,good,%1$s,1,accept\nX,good,%1$s,1,accept\nG,good,%1$s,1,accept\n"
                        .formatted(ana);

        assertThatThrownBy(() -> take(Consent.EVERYTHING_NEW, file)).isInstanceOfSatisfying(Refusal.class, refusal -> {
            assertThat(refusal.rows()).extracting(row -> row.row()).containsExactly(2L, 3L);
            assertThat(refusal.rowsInAll()).isEqualTo(2);
        });
        assertThat(appraisers.byCode(SiteId.MAIN, ana))
                .as("nothing was entered")
                .isEmpty();
    }

    @Test
    void noticesTheSameBytesForTheSameTaskSetAndDay() {
        String file = twoPieces(ana, "accept");
        StudyHead first = take(Consent.EVERYTHING_NEW, file);

        ImportOutcome again = imports.take(ENGINEER, request(Consent.EVERYTHING_NEW), read(file), Watcher.NONE);
        Consent repeat = new Consent(false, false, false, Map.of(), true);
        StudyHead second = take(repeat, file);

        assertThat(again).isEqualTo(new ImportOutcome.Asked(false, List.of(), List.of(), first.id()));
        assertThat(second.id()).isNotEqualTo(first.id());
    }

    @Test
    void storesTheSameBytesOnceWhenTwoPeopleSendThemAtOnce() throws Exception {
        knownSet();
        appraisers.create(ENGINEER, ana, ana, AppraiserKind.PERSON);
        String file = "piece,appraiser,trial,call\nG,%s,1,accept\n".formatted(ana);
        Callable<Boolean> take = () -> {
            try {
                return imports.take(ENGINEER, request(Consent.NOTHING), read(file), Watcher.NONE)
                        instanceof ImportOutcome.Stored;
            } catch (Refusal refusal) {
                assertThat(refusal.type()).isEqualTo("duplicate-study");
                return false;
            }
        };
        ExecutorService two = Executors.newFixedThreadPool(2);
        try {
            int stored = 0;
            for (Future<Boolean> one : two.invokeAll(List.of(take, take))) {
                stored += one.get() ? 1 : 0;
            }
            assertThat(stored).isEqualTo(1);
        } finally {
            two.shutdown();
        }
    }

    @Test
    void refusesADayThatLiesAheadAtTheSite() {
        LocalDate tomorrow = sites.today(SiteId.MAIN).plusDays(1);
        StudyRequest ahead = new StudyRequest(task.code(), set, tomorrow, null, true, "", Consent.EVERYTHING_NEW);

        assertRefused("study-lies-ahead", () -> take(ahead, twoPieces(ana, "accept")));
    }

    @Test
    void refusesWhatCannotBeAStudy() {
        assertRefused(
                "unknown-task",
                () -> take(
                        new StudyRequest("no", set, DAY, null, true, "", Consent.NOTHING), twoPieces(ana, "accept")));
        assertRefused(
                "unknown-set-without-truths",
                () -> take(Consent.EVERYTHING_NEW, "piece,appraiser,trial,call\n1,%s,1,accept\n".formatted(ana)));
        assertRefused("file-without-calls", () -> take(Consent.EVERYTHING_NEW, twoPieces(ana, "")));
    }

    @Test
    void refusesASetOfAnotherTask() {
        knownSet();
        tasks.create(ENGINEER, task.code() + "-2", "Another", List.of());
        StudyRequest other = new StudyRequest(task.code() + "-2", set, DAY, null, true, "", Consent.EVERYTHING_NEW);

        assertRefused("set-of-another-task", () -> take(other, twoPieces(ana, "accept")));
    }

    @Test
    void keepsWhichCameraConfigurationTheStudyNames() {
        camera();

        StudyHead study = take(requestWith("recipe 1", DAY), twoPieces(ana, "accept"));

        assertThat(study.appraisers().get(0).configuration()).isEqualTo(1);
    }

    @Test
    void refusesAConfigurationThatWasNotInForceThatDay() {
        camera();

        assertRefused(
                "configuration-not-in-force",
                () -> take(requestWith("recipe 1", DAY.plusDays(2)), twoPieces(ana, "accept")));
        assertRefused(
                "configuration-not-in-force",
                () -> take(requestWith("recipe 2", DAY.minusDays(1)), twoPieces(ana, "accept")));
        assertRefused("unknown-configuration", () -> take(requestWith("recipe 3", DAY), twoPieces(ana, "accept")));
    }

    @Test
    void leavesNothingBehindWhenTheUserStopsIt() {
        StringBuilder file = new StringBuilder("piece,reference,appraiser,trial,call\n");
        for (int piece = 0; piece < 20_000; piece++) {
            file.append(piece).append(",good,").append(ana).append(",1,accept\n");
        }
        RecordedCalls calls = read(file.toString());

        assertThatThrownBy(() -> imports.take(ENGINEER, request(Consent.EVERYTHING_NEW), calls, (rows, bytes) -> false))
                .isInstanceOf(CancellationException.class);

        assertThat(sets.byCode(SiteId.MAIN, set)).isEmpty();
        assertThat(appraisers.byCode(SiteId.MAIN, ana)).isEmpty();
    }

    @Test
    void concludesAStudyThatWasStoredOpenAndOnlyOnce() {
        StudyRequest open = new StudyRequest(task.code(), set, DAY, null, false, "", Consent.EVERYTHING_NEW);
        StudyHead study = take(open, twoPieces(ana, "reject"));

        assertThat(studies.findings(study)).isEmpty();
        studies.conclude(ENGINEER, studies.get(SiteId.MAIN, study.id()));

        assertThat(studies.findings(study)).isPresent();
        assertRefused(
                "study-concluded-already", () -> studies.conclude(ENGINEER, studies.get(SiteId.MAIN, study.id())));
    }

    @Test
    void countsWhoBringsAFileWithTrueStatesAsHavingSeenTheKey() {
        knownSet();
        take(Consent.EVERYTHING_NEW, "piece,appraiser,trial,call\nG,%s,1,accept\n".formatted(ana));
        ReferenceSet known = sets.byCode(SiteId.MAIN, set).orElseThrow();
        assertThat(sets.keyReadings(known, 1))
                .as("a file without true states shows none")
                .isEmpty();

        take(Consent.EVERYTHING_NEW, "piece,reference,appraiser,trial,call\nG,good,%s,1,accept\n".formatted(ana));

        assertThat(sets.keyReadings(known, 1)).extracting(KeyReading::who).containsExactly("account:7");
    }

    @Test
    void letsTheDatabaseRefuseACallThatBelongsToNothing() {
        StudyHead study = take(Consent.EVERYTHING_NEW, twoPieces(ana, "accept"));

        for (String stray : List.of("7, 0, null", "0, 7, null", "0, 0, 7")) {
            assertThatThrownBy(() -> jdbc.sql(
                                    "insert into study_call (site_id, study_id, trial, appraiser_no, piece_no, kind_no, accepted) values (1, "
                                            + study.id() + ", 2, " + stray + ", true)")
                            .update())
                    .as(stray)
                    .rootCause()
                    .hasMessageContaining("that its study does not have");
        }
    }

    @Test
    void neverLetsTheProgramChangeACall() {
        take(Consent.EVERYTHING_NEW, twoPieces(ana, "accept"));

        assertThatThrownBy(
                        () -> jdbc.sql("update study_call set accepted = false").update())
                .rootCause()
                .hasMessageContaining("permission denied");
        assertThatThrownBy(() -> jdbc.sql("delete from finding").update())
                .rootCause()
                .hasMessageContaining("permission denied");
    }

    @Test
    void journalsAnImportAsOneEntryAndItsConclusionAsAnother() {
        StudyHead study = take(Consent.EVERYTHING_NEW, twoPieces(ana, "accept"));

        assertThat(journal.before(SiteId.MAIN, Long.MAX_VALUE, 200))
                .filteredOn(entry -> entry.subject().equals("study:" + study.id()))
                .extracting(entry -> entry.act())
                .containsExactlyInAnyOrder("study.imported", "study.concluded");
        assertThat(journal.verify(SiteId.MAIN).intact()).isTrue();
    }

    private void knownSet() {
        sets.create(
                ENGINEER,
                task,
                new NewSet(
                        set,
                        DAY,
                        "A. Holm",
                        null,
                        Basis.DECISION,
                        List.of(
                                new NewPiece("G", TrueState.GOOD, null, null),
                                new NewPiece("D", TrueState.DEFECTIVE, null, null),
                                new NewPiece("U", TrueState.GREY, null, null))));
    }

    /** Recipe 1 from before the day on, recipe 2 from noon of the day after. */
    private void camera() {
        ZoneId zone = sites.get(SiteId.MAIN).zone();
        Instant noonAfter = DAY.plusDays(1).atTime(12, 0).atZone(zone).toInstant();
        appraisers.create(ENGINEER, ana, "Camera " + ana, AppraiserKind.CAMERA);
        appraisers.addConfiguration(ENGINEER, ana, "recipe 1", noonAfter.minus(Duration.ofDays(30)), "");
        appraisers.addConfiguration(ENGINEER, ana, "recipe 2", noonAfter, "");
    }

    private StudyRequest request(Consent consent) {
        return new StudyRequest(task.code(), set, DAY, null, true, "calls.csv", consent);
    }

    private StudyRequest requestWith(@Nullable String configuration, LocalDate day) {
        return new StudyRequest(task.code(), set, day, configuration, true, "", Consent.EVERYTHING_NEW);
    }

    private StudyHead take(Consent consent, String file) {
        return take(request(consent), file);
    }

    private StudyHead take(StudyRequest request, String file) {
        return stored(imports.take(ENGINEER, request, read(file), Watcher.NONE));
    }

    private static StudyHead stored(ImportOutcome outcome) {
        assertThat(outcome).isInstanceOf(ImportOutcome.Stored.class);
        return ((ImportOutcome.Stored) outcome).study();
    }

    private static String twoPieces(String appraiser, String call) {
        return "piece,reference,appraiser,trial,call\n1,good,%1$s,1,%2$s\n2,defective,%1$s,1,%2$s\n"
                .formatted(appraiser, call);
    }

    private static RecordedCalls read(String csv) {
        try {
            Reading reading =
                    CallReader.standard().read(new ByteArrayInputStream(csv.getBytes(StandardCharsets.UTF_8)));
            assertThat(reading).isInstanceOf(Reading.Read.class);
            return ((Reading.Read) reading).calls();
        } catch (IOException e) {
            throw new AssertionError(e);
        }
    }

    private static void assertRefused(String type, ThrowingCallable act) {
        assertThatThrownBy(act)
                .isInstanceOfSatisfying(
                        Refusal.class, refusal -> assertThat(refusal.type()).isEqualTo(type));
    }
}
