package org.levelgaze.register;

import io.swagger.v3.oas.annotations.Operation;
import io.swagger.v3.oas.annotations.responses.ApiResponse;
import jakarta.validation.Valid;
import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.NotNull;
import java.net.URI;
import java.time.Instant;
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

/** Appraisers and their configurations over the API. */
@RestController
@RequestMapping("/api/v1/appraisers")
class AppraiserApi {

    private final Appraisers appraisers;

    AppraiserApi(Appraisers appraisers) {
        this.appraisers = appraisers;
    }

    record NewAppraiser(
            @NotBlank String code,
            @Nullable String name,
            @NotBlank String kind) {}

    record NewConfiguration(
            @NotBlank String label,
            @NotNull Instant changedAt,
            @Nullable String note) {}

    record ConfigurationAnswer(int id, String label, Instant changedAt, String note) {

        static ConfigurationAnswer of(CameraConfiguration configuration) {
            return new ConfigurationAnswer(
                    configuration.number(), configuration.label(), configuration.changedAt(), configuration.note());
        }
    }

    record AppraiserAnswer(long id, String code, String name, String kind, List<ConfigurationAnswer> configurations) {

        static AppraiserAnswer of(Appraiser appraiser) {
            List<ConfigurationAnswer> configurations = appraiser.configurations().stream()
                    .map(ConfigurationAnswer::of)
                    .toList();
            return new AppraiserAnswer(
                    appraiser.id(),
                    appraiser.code(),
                    appraiser.name(),
                    appraiser.kind().word(),
                    configurations);
        }
    }

    @Operation(summary = "Enter a person or a camera", responses = @ApiResponse(responseCode = "201"))
    @PostMapping
    ResponseEntity<AppraiserAnswer> create(Actor actor, @Valid @RequestBody NewAppraiser appraiser) {
        AppraiserKind kind = Words.read("kind", appraiser.kind(), AppraiserKind::ofWord, "person, camera");
        String name = appraiser.name() == null ? appraiser.code() : appraiser.name();
        Appraiser created = appraisers.create(actor, appraiser.code(), name, kind);
        return ResponseEntity.created(address(created.code())).body(AppraiserAnswer.of(created));
    }

    @Operation(summary = "The appraisers, by code")
    @GetMapping
    Listing<AppraiserAnswer> list(
            Actor actor,
            @RequestParam(required = false) @Nullable String after,
            @RequestParam(defaultValue = "100") int limit) {
        List<AppraiserAnswer> all =
                appraisers.all(actor.site()).stream().map(AppraiserAnswer::of).toList();
        return Listing.page(all, AppraiserAnswer::code, after, limit);
    }

    @Operation(summary = "One appraiser")
    @GetMapping("/{code}")
    AppraiserAnswer read(Actor actor, @PathVariable String code) {
        return AppraiserAnswer.of(find(actor, code));
    }

    @Operation(summary = "Say what a camera judges with, from when on", responses = @ApiResponse(responseCode = "201"))
    @PostMapping("/{code}/configurations")
    ResponseEntity<ConfigurationAnswer> addConfiguration(
            Actor actor, @PathVariable String code, @Valid @RequestBody NewConfiguration configuration) {
        String note = configuration.note() == null ? "" : configuration.note();
        Appraiser camera =
                appraisers.addConfiguration(actor, code, configuration.label(), configuration.changedAt(), note);
        return camera.configuration(configuration.label())
                .map(ConfigurationAnswer::of)
                .map(answer ->
                        ResponseEntity.created(address(code, "configurations")).body(answer))
                .orElseThrow();
    }

    @Operation(summary = "What a camera has judged with")
    @GetMapping("/{code}/configurations")
    Listing<ConfigurationAnswer> configurations(Actor actor, @PathVariable String code) {
        return new Listing<>(AppraiserAnswer.of(find(actor, code)).configurations(), null);
    }

    private Appraiser find(Actor actor, String code) {
        return appraisers
                .byCode(actor.site(), code)
                .orElseThrow(() -> new Refusal(Refusal.Kind.NOT_FOUND, "unknown-appraiser", code));
    }

    private static URI address(String... segments) {
        return UriComponentsBuilder.fromPath("/api/v1/appraisers")
                .pathSegment(segments)
                .encode()
                .build()
                .toUri();
    }
}
