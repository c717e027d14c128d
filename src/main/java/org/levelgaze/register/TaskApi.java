package org.levelgaze.register;

import io.swagger.v3.oas.annotations.Operation;
import io.swagger.v3.oas.annotations.responses.ApiResponse;
import jakarta.validation.Valid;
import jakarta.validation.constraints.NotBlank;
import java.net.URI;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.Listing;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.Words;
import org.springframework.http.ResponseEntity;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestBody;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;
import org.springframework.web.util.UriComponentsBuilder;

/** Tasks over the API. */
@RestController
@RequestMapping("/api/v1/tasks")
class TaskApi {

    private final Tasks tasks;

    TaskApi(Tasks tasks) {
        this.tasks = tasks;
    }

    record NewKind(
            @NotBlank String code,
            @Nullable String name,
            @Nullable String severity) {

        DefectKind toKind() {
            Severity rated = severity == null
                    ? null
                    : Words.read("severity", severity, Severity::ofWord, "critical, major, minor");
            return new DefectKind(code, name == null ? code : name, rated);
        }
    }

    record NewTask(
            @NotBlank String code,
            @Nullable String name,
            @Nullable List<@Valid NewKind> defectKinds) {

        List<DefectKind> kinds() {
            return defectKinds == null
                    ? List.of()
                    : defectKinds.stream().map(NewKind::toKind).toList();
        }
    }

    record KindAnswer(String code, String name, @Nullable String severity) {}

    record TaskAnswer(long id, String code, String name, List<KindAnswer> defectKinds) {

        static TaskAnswer of(Task task) {
            List<KindAnswer> kinds =
                    task.defectKinds().stream().map(TaskAnswer::kind).toList();
            return new TaskAnswer(task.id(), task.code(), task.name(), kinds);
        }

        private static KindAnswer kind(DefectKind kind) {
            Severity severity = kind.severity();
            return new KindAnswer(kind.code(), kind.name(), severity == null ? null : severity.word());
        }
    }

    @Operation(summary = "Enter a task with its defect kinds", responses = @ApiResponse(responseCode = "201"))
    @PostMapping
    ResponseEntity<TaskAnswer> create(Actor actor, @Valid @RequestBody NewTask task) {
        String name = task.name() == null ? task.code() : task.name();
        Task created = tasks.create(actor, task.code(), name, task.kinds());
        return ResponseEntity.created(address(created.code())).body(TaskAnswer.of(created));
    }

    @Operation(summary = "The tasks, by code")
    @GetMapping
    Listing<TaskAnswer> list(
            Actor actor,
            @RequestParam(required = false) @Nullable String after,
            @RequestParam(defaultValue = "100") int limit) {
        List<TaskAnswer> all =
                tasks.all(actor.site()).stream().map(TaskAnswer::of).toList();
        return Listing.page(all, TaskAnswer::code, after, limit);
    }

    @Operation(summary = "One task")
    @GetMapping("/{code}")
    TaskAnswer read(Actor actor, @PathVariable String code) {
        return tasks.byCode(actor.site(), code)
                .map(TaskAnswer::of)
                .orElseThrow(() -> new Refusal(Refusal.Kind.NOT_FOUND, "unknown-task", code));
    }

    private static URI address(String code) {
        return UriComponentsBuilder.fromPath("/api/v1/tasks")
                .pathSegment(code)
                .encode()
                .build()
                .toUri();
    }
}
