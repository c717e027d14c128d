package org.levelgaze.studies;

import io.swagger.v3.oas.annotations.Operation;
import io.swagger.v3.oas.annotations.Parameter;
import io.swagger.v3.oas.annotations.media.Content;
import io.swagger.v3.oas.annotations.media.Schema;
import io.swagger.v3.oas.annotations.responses.ApiResponse;
import java.io.IOException;
import java.io.InputStream;
import java.net.URI;
import java.time.Instant;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.Appraiser;
import org.levelgaze.register.Appraisers;
import org.levelgaze.register.Tasks;
import org.levelgaze.sets.ReferenceSets;
import org.levelgaze.shared.Listing;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.RowError;
import org.levelgaze.studies.reading.CallReader;
import org.levelgaze.studies.reading.Reading;
import org.levelgaze.studies.reading.RecordedCalls;
import org.levelgaze.studies.reading.Watcher;
import org.springframework.http.HttpHeaders;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestHeader;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;

/** Studies over the API. */
@RestController
@RequestMapping("/api/v1/studies")
class StudyApi {

    /** Bad rows that one answer lists; a program that sends more of them has another fault than those rows. */
    private static final int BAD_ROWS = 10_000;

    private final StudyImport imports;
    private final Studies studies;
    private final Tasks tasks;
    private final ReferenceSets sets;
    private final Appraisers appraisers;
    private final LargestFile largest;

    StudyApi(
            StudyImport imports,
            Studies studies,
            Tasks tasks,
            ReferenceSets sets,
            Appraisers appraisers,
            LargestFile largest) {
        this.imports = imports;
        this.studies = studies;
        this.tasks = tasks;
        this.sets = sets;
        this.appraisers = appraisers;
        this.largest = largest;
    }

    /** Who took part: {@code configuration} is the label that the study names, null when it names none. */
    record ParticipantAnswer(String appraiser, @Nullable String configuration, int trials) {}

    record StudyAnswer(
            long id,
            String task,
            String set,
            int edition,
            LocalDate performedOn,
            int pieces,
            long calls,
            long callsMissing,
            Instant recordedAt,
            @Nullable Instant concludedAt,
            List<ParticipantAnswer> appraisers,
            List<String> notes) {}

    @Operation(
            summary = "Bring a study as a file of calls",
            requestBody =
                    @io.swagger.v3.oas.annotations.parameters.RequestBody(
                            required = true,
                            content = @Content(mediaType = "text/csv", schema = @Schema(type = "string"))),
            responses = @ApiResponse(responseCode = "201"))
    @PostMapping(consumes = {"text/csv", MediaType.TEXT_PLAIN_VALUE, MediaType.APPLICATION_OCTET_STREAM_VALUE})
    ResponseEntity<StudyAnswer> create(
            Actor actor,
            @RequestParam String task,
            @RequestParam String set,
            @RequestParam LocalDate performedOn,
            @RequestParam(required = false) @Nullable String configuration,
            @RequestParam(defaultValue = "true") boolean conclude,
            @RequestParam(defaultValue = "false") boolean create,
            @Parameter(hidden = true) @RequestHeader(name = HttpHeaders.CONTENT_LENGTH, defaultValue = "-1")
                    long length,
            InputStream body)
            throws IOException {
        RecordedCalls calls = read(largest.within(body, length));
        Consent consent = create ? Consent.EVERYTHING_NEW : Consent.NOTHING;
        StudyRequest request = new StudyRequest(task, set, performedOn, configuration, conclude, "", consent);
        StudyHead stored = stored(request, imports.take(actor, request, calls, Watcher.NONE));
        return ResponseEntity.created(URI.create("/api/v1/studies/" + stored.id()))
                .body(new Answers().of(studies.get(actor.site(), stored.id())));
    }

    @Operation(summary = "The studies, the latest day first")
    @GetMapping
    Listing<StudyAnswer> list(
            Actor actor,
            @RequestParam(required = false) @Nullable String task,
            @RequestParam(required = false) @Nullable String after,
            @RequestParam(defaultValue = "100") int limit) {
        Long taskId = task == null ? null : taskId(actor, task);
        int size = Math.max(1, Math.min(limit, Listing.LARGEST_PAGE));
        StudyFilter filter = new StudyFilter(taskId, null, null, null, null);
        List<StudyHead> found = after == null
                ? studies.page(actor.site(), filter, 0, size + 1)
                : studies.after(actor.site(), filter, StudyCursor.of(after), size + 1);
        List<StudyHead> page = found.subList(0, Math.min(size, found.size()));
        String next =
                found.size() > size ? StudyCursor.after(page.get(size - 1)).text() : null;
        return new Listing<>(page.stream().map(new Answers()::of).toList(), next);
    }

    @Operation(summary = "One study, without its calls")
    @GetMapping("/{id}")
    StudyAnswer read(Actor actor, @PathVariable long id) {
        return new Answers().of(studies.get(actor.site(), id));
    }

    /** The findings to the letter as they were stored. */
    @Operation(summary = "What a study showed")
    @GetMapping(path = "/{id}/findings", produces = MediaType.APPLICATION_JSON_VALUE)
    String findings(Actor actor, @PathVariable long id) {
        return studies.findingsJson(studies.get(actor.site(), id))
                .orElseThrow(() -> new Refusal(Refusal.Kind.CONFLICT, "study-not-concluded", Long.toString(id)));
    }

    private long taskId(Actor actor, String code) {
        return tasks.byCode(actor.site(), code)
                .orElseThrow(() -> new Refusal(Refusal.Kind.NOT_FOUND, "unknown-task", code))
                .id();
    }

    private static RecordedCalls read(InputStream body) throws IOException {
        List<RowError> bad = new ArrayList<>();
        Reading reading = CallReader.standard().read(body, Watcher.NONE, row -> {
            if (bad.size() < BAD_ROWS) {
                bad.add(row);
            }
        });
        if (reading instanceof Reading.Refused refused) {
            bad.sort(Comparator.comparingLong(RowError::row));
            throw new Refusal(Refusal.Kind.INVALID, "bad-rows", List.of(refused.inAll()), bad, refused.inAll());
        }
        return ((Reading.Read) reading).calls();
    }

    /** Over the API nobody can be asked: what a page would ask is refused here. */
    private static StudyHead stored(StudyRequest request, ImportOutcome outcome) {
        if (outcome instanceof ImportOutcome.Stored done) {
            return done.study();
        }
        ImportOutcome.Asked asked = (ImportOutcome.Asked) outcome;
        if (asked.duplicateOf() != null) {
            throw new Refusal(
                    Refusal.Kind.CONFLICT,
                    "duplicate-study",
                    request.performedOn().toString());
        }
        if (asked.unknownSet()) {
            throw new Refusal(Refusal.Kind.INVALID, "unknown-set", request.set());
        }
        if (!asked.unknownAppraisers().isEmpty()) {
            String words = String.join(", ", asked.unknownAppraisers());
            throw new Refusal(Refusal.Kind.INVALID, "unknown-appraisers", words);
        }
        throw new Refusal(
                Refusal.Kind.INVALID, "unknown-defect-kinds", String.join(", ", asked.unknownKinds()), request.task());
    }

    /** Words studies for one answer; what several of them share is read once. */
    private final class Answers {

        private final Map<Long, String> taskCodes = new HashMap<>();
        private final Map<Long, String> setCodes = new HashMap<>();
        private final Map<Long, Appraiser> taking = new HashMap<>();

        StudyAnswer of(StudyHead study) {
            List<ParticipantAnswer> answers = new ArrayList<>();
            study.appraisers().forEach(one -> answers.add(participant(study, one)));
            return new StudyAnswer(
                    study.id(),
                    taskCodes.computeIfAbsent(
                            study.taskId(), id -> tasks.get(study.site(), id).code()),
                    setCodes.computeIfAbsent(
                            study.setId(), id -> sets.get(study.site(), id).code()),
                    study.edition(),
                    study.performedOn(),
                    study.pieces(),
                    study.calls(),
                    study.callsMissing(),
                    study.recordedAt(),
                    study.concludedAt(),
                    answers,
                    study.callsMissing() == 0
                            ? List.of()
                            : List.of(study.callsMissing() + " calls missing in the file"));
        }

        private ParticipantAnswer participant(StudyHead study, StudyHead.Participant one) {
            Appraiser appraiser = taking.computeIfAbsent(one.appraiserId(), id -> appraisers.get(study.site(), id));
            Integer number = one.configuration();
            String label = number == null
                    ? null
                    : appraiser.configurations().stream()
                            .filter(configuration -> configuration.number() == number)
                            .findFirst()
                            .orElseThrow()
                            .label();
            return new ParticipantAnswer(appraiser.code(), label, one.trials());
        }
    }
}
