package org.levelgaze.demo;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.time.LocalDate;
import java.time.LocalTime;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.SplittableRandom;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.AppraiserKind;
import org.levelgaze.register.Appraisers;
import org.levelgaze.register.DefectKind;
import org.levelgaze.register.Severity;
import org.levelgaze.register.Task;
import org.levelgaze.register.Tasks;
import org.levelgaze.sets.Basis;
import org.levelgaze.sets.NewSet;
import org.levelgaze.sets.ReferenceSets;
import org.levelgaze.shared.SiteId;
import org.levelgaze.shared.Sites;
import org.levelgaze.studies.Consent;
import org.levelgaze.studies.ImportOutcome;
import org.levelgaze.studies.StudyImport;
import org.levelgaze.studies.StudyRequest;
import org.levelgaze.studies.reading.CallReader;
import org.levelgaze.studies.reading.Reading;
import org.levelgaze.studies.reading.Watcher;
import org.springframework.stereotype.Component;
import org.springframework.transaction.annotation.Transactional;

/**
 * Tarnhollow Stoneware, an invented maker of hand-glazed stoneware: three people and a camera, two tasks, three sets and a
 * dozen studies over two years. Bram becomes lenient; the camera becomes better with its second configuration; one old set
 * holds only two defective pieces.
 */
@Component
class DemoPlant {

    private static final long SEED = 4711;
    private static final double DAYS_A_YEAR = 365.25;

    private static final Judge ANA = new Judge("ANA", 0.02, 0.02, 0.04);
    private static final Judge BRAM = new Judge("BRAM", 0.02, 0.12, 0.03);
    private static final Judge MIRA = new Judge("MIRA", 0.04, 0.02, 0.09);
    private static final Judge CAMERA_BEFORE = new Judge("RIM-CAM", 0.08, 0.08, 0.12);
    private static final Judge CAMERA_AFTER = new Judge("RIM-CAM", 0.02, 0.02, 0.05);

    private final Tasks tasks;
    private final Appraisers appraisers;
    private final ReferenceSets sets;
    private final StudyImport imports;
    private final Sites sites;

    DemoPlant(Tasks tasks, Appraisers appraisers, ReferenceSets sets, StudyImport imports, Sites sites) {
        this.tasks = tasks;
        this.appraisers = appraisers;
        this.sets = sets;
        this.imports = imports;
        this.sites = sites;
    }

    /**
     * Makes the plant, all of it or nothing; does nothing where there is a task already.
     *
     * @param site where; no task may be there yet
     * @return whether it was made
     */
    @Transactional
    public boolean make(SiteId site) {
        if (!tasks.all(site).isEmpty()) {
            return false;
        }
        Actor actor = Actor.system(site);
        LocalDate today = sites.today(site);
        LocalDate begin = today.minusYears(2);
        enterPeople(actor);
        enterCamera(actor, begin, today.minusMonths(9));
        glazeStudies(actor, begin, today);
        rimStudies(actor, begin, today);
        return true;
    }

    private void enterPeople(Actor actor) {
        appraisers.create(actor, "ANA", "Ana Lindqvist", AppraiserKind.PERSON);
        appraisers.create(actor, "BRAM", "Bram Ødegaard", AppraiserKind.PERSON);
        appraisers.create(actor, "MIRA", "Mira Šimková", AppraiserKind.PERSON);
    }

    private void enterCamera(Actor actor, LocalDate begin, LocalDate change) {
        ZoneId zone = sites.get(actor.site()).zone();
        appraisers.create(actor, "RIM-CAM", "Rim camera, kiln exit 2", AppraiserKind.CAMERA);
        appraisers.addConfiguration(
                actor,
                "RIM-CAM",
                "recipe 11, firmware 2.4",
                begin.atTime(LocalTime.of(6, 30)).atZone(zone).toInstant(),
                "First recipe for the rim, ring light at 40 %.");
        appraisers.addConfiguration(
                actor,
                "RIM-CAM",
                "recipe 14, firmware 3.0",
                change.atTime(LocalTime.of(6, 30)).atZone(zone).toInstant(),
                "New firmware, ring light at 55 %, lens cleaned.");
    }

    private void glazeStudies(Actor actor, LocalDate begin, LocalDate today) {
        Task glaze = tasks.create(
                actor,
                "GLAZE",
                "Glaze of bowls and plates",
                List.of(
                        new DefectKind("PINHOLE", "Pinhole", Severity.MINOR),
                        new DefectKind("CRAWL", "Crawled glaze", Severity.MAJOR),
                        new DefectKind("CRACK", "Crack through the glaze", Severity.CRITICAL)));
        List<DemoPiece> first = pieces("GL", 20, 20, "PINHOLE", "CRAWL", "CRACK");
        List<DemoPiece> second = pieces("GM", 20, 20, "PINHOLE", "CRAWL", "CRACK");
        enterSet(actor, glaze, "GLAZE-A", begin.minusDays(20), begin.plusMonths(12), first);
        enterSet(actor, glaze, "GLAZE-B", begin.plusMonths(11), today.plusMonths(5), second);
        List<Judge> people = List.of(ANA, BRAM, MIRA);
        study(actor, "GLAZE", "GLAZE-A", first, people, begin, begin.plusDays(6), null);
        study(actor, "GLAZE", "GLAZE-A", first, people, begin, begin.plusMonths(5), null);
        study(actor, "GLAZE", "GLAZE-A", first, people, begin, begin.plusMonths(10), null);
        study(actor, "GLAZE", "GLAZE-B", second, people, begin, begin.plusMonths(14), null);
        study(actor, "GLAZE", "GLAZE-B", second, people, begin, begin.plusMonths(18), null);
        study(actor, "GLAZE", "GLAZE-B", second, people, begin, today.minusDays(12), null);
    }

    private void rimStudies(Actor actor, LocalDate begin, LocalDate today) {
        Task rim = tasks.create(
                actor,
                "RIM",
                "Rim of mugs, kiln exit 2",
                List.of(
                        new DefectKind("CHIP", "Chip", Severity.CRITICAL),
                        new DefectKind("WARP", "Warped rim", Severity.MAJOR)));
        List<DemoPiece> old = pieces("RO", 18, 2, "CHIP");
        List<DemoPiece> now = pieces("RM", 15, 15, "CHIP", "WARP");
        enterSet(actor, rim, "RIM-OLD", begin.minusMonths(3), begin.plusMonths(9), old);
        enterSet(actor, rim, "RIM-B", begin.plusMonths(2), today.plusMonths(1), now);
        study(actor, "RIM", "RIM-OLD", old, List.of(ANA, MIRA), begin, begin.plusDays(20), null);
        study(actor, "RIM", "RIM-B", now, List.of(ANA, MIRA), begin, begin.plusMonths(7), null);
        study(
                actor,
                "RIM",
                "RIM-B",
                now,
                List.of(CAMERA_BEFORE),
                begin,
                begin.plusMonths(3),
                "recipe 11, firmware 2.4");
        study(
                actor,
                "RIM",
                "RIM-B",
                now,
                List.of(CAMERA_BEFORE),
                begin,
                begin.plusMonths(13),
                "recipe 11, firmware 2.4");
        study(
                actor,
                "RIM",
                "RIM-B",
                now,
                List.of(CAMERA_AFTER),
                begin,
                today.minusMonths(8),
                "recipe 14, firmware 3.0");
        study(actor, "RIM", "RIM-B", now, List.of(ANA, MIRA), begin, today.minusMonths(2), null);
    }

    private void enterSet(
            Actor actor, Task task, String code, LocalDate decided, LocalDate validUntil, List<DemoPiece> pieces) {
        sets.create(
                actor,
                task,
                new NewSet(
                        code,
                        decided,
                        "Solveig Tarn, holder of the standard",
                        validUntil,
                        Basis.DECISION,
                        pieces.stream().map(DemoPiece::toPiece).toList()));
    }

    private void study(
            Actor actor,
            String task,
            String set,
            List<DemoPiece> pieces,
            List<Judge> judges,
            LocalDate begin,
            LocalDate day,
            @Nullable String configuration) {
        double years = (day.toEpochDay() - begin.toEpochDay()) / DAYS_A_YEAR;
        SplittableRandom chance = new SplittableRandom(SEED + (task + set).hashCode() + Math.round(years * 12));
        int trials = configuration == null ? 2 : 3;
        String csv = new CallSheet(pieces, judges, trials, years, chance).csv();
        String file = task.toLowerCase(Locale.ROOT) + "-" + day + ".csv";
        StudyRequest request = new StudyRequest(task, set, day, configuration, true, file, Consent.NOTHING);
        try {
            Reading reading =
                    CallReader.standard().read(new ByteArrayInputStream(csv.getBytes(StandardCharsets.UTF_8)));
            ImportOutcome outcome = imports.take(actor, request, ((Reading.Read) reading).calls(), Watcher.NONE);
            if (!(outcome instanceof ImportOutcome.Stored)) {
                throw new IllegalStateException("The study of " + day + " was not stored: " + outcome);
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** Good pieces first, then defective ones with the kinds in turn; every fourth is hard to call. */
    private static List<DemoPiece> pieces(String prefix, int good, int defective, String... kinds) {
        List<DemoPiece> pieces = new ArrayList<>();
        for (int i = 0; i < good + defective; i++) {
            String label = "%s-%02d".formatted(prefix, i + 1);
            pieces.add(new DemoPiece(label, i < good ? null : kinds[i % kinds.length], i % 4 == 3));
        }
        return pieces;
    }
}
