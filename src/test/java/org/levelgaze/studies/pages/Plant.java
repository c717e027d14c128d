package org.levelgaze.studies.pages;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.time.LocalDate;
import java.util.List;
import java.util.Objects;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.Tasks;
import org.levelgaze.shared.SiteId;
import org.levelgaze.studies.Consent;
import org.levelgaze.studies.ImportOutcome;
import org.levelgaze.studies.StudyHead;
import org.levelgaze.studies.StudyImport;
import org.levelgaze.studies.StudyRequest;
import org.levelgaze.studies.reading.CallReader;
import org.levelgaze.studies.reading.Reading;
import org.levelgaze.studies.reading.RecordedCalls;
import org.levelgaze.studies.reading.Watcher;
import org.springframework.context.ApplicationContext;

/** Studies of the invented Tarnhollow Stoneware, brought in as a user's click brings them. */
final class Plant {

    static final Actor ENGINEER = new Actor(SiteId.MAIN, "account:7");
    static final LocalDate DAY = LocalDate.of(2026, 3, 2);

    private final ApplicationContext program;

    Plant(ApplicationContext program) {
        this.program = program;
    }

    <T> T get(Class<T> type) {
        return program.getBean(type);
    }

    /** Stores a study and enters whatever is new; the names of task, set and appraisers carry the mark. */
    StudyHead study(String mark, LocalDate day, boolean conclude, String csv) {
        Tasks tasks = get(Tasks.class);
        String task = "RIM-" + mark;
        if (tasks.byCode(SiteId.MAIN, task).isEmpty()) {
            tasks.create(ENGINEER, task, "Rim of mugs " + mark, List.of());
        }
        StudyRequest request =
                new StudyRequest(task, "G-" + mark, day, null, conclude, "calls.csv", Consent.EVERYTHING_NEW);
        ImportOutcome outcome = get(StudyImport.class).take(ENGINEER, request, read(csv), Watcher.NONE);
        return ((ImportOutcome.Stored) outcome).study();
    }

    /** The published study of 50 pieces, 3 appraisers and 3 trials (AIAG MSA 4th ed., from memory). */
    static String published() {
        try (var file = Objects.requireNonNull(Plant.class.getResourceAsStream("/reference/aiag_msa4_calls.csv"))) {
            return new String(file.readAllBytes(), StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static RecordedCalls read(String csv) {
        try {
            Reading reading =
                    CallReader.standard().read(new ByteArrayInputStream(csv.getBytes(StandardCharsets.UTF_8)));
            return ((Reading.Read) reading).calls();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
