package org.levelgaze.sets;

import io.swagger.v3.oas.annotations.Operation;
import io.swagger.v3.oas.annotations.responses.ApiResponse;
import jakarta.validation.Valid;
import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.NotNull;
import java.net.URI;
import java.time.LocalDate;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.Task;
import org.levelgaze.register.Tasks;
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

/** Reference sets over the API. */
@RestController
@RequestMapping("/api/v1/sets")
class SetApi {

    private final ReferenceSets sets;
    private final Tasks tasks;

    SetApi(ReferenceSets sets, Tasks tasks) {
        this.sets = sets;
        this.tasks = tasks;
    }

    record NewPieceBody(
            @NotBlank String label,
            @NotBlank String trueState,
            @Nullable String defectKind,
            @Nullable String zone) {

        NewPiece toPiece() {
            TrueState state = Words.read("trueState", trueState, TrueState::ofWord, "good, defective, grey");
            Zone read = zone == null
                    ? null
                    : Words.read("zone", zone, Zone::ofWords, "clear good, borderline, clear defective");
            return new NewPiece(label, state, defectKind, read);
        }
    }

    record NewSetBody(
            @NotBlank String code,
            @NotBlank String task,
            @Nullable LocalDate validUntil,
            @NotNull LocalDate decidedOn,
            @Nullable String decidedBy,
            @NotNull List<@Valid NewPieceBody> pieces) {

        NewSet toSet() {
            return new NewSet(
                    code,
                    decidedOn,
                    decidedBy == null ? "" : decidedBy,
                    validUntil,
                    Basis.DECISION,
                    pieces.stream().map(NewPieceBody::toPiece).toList());
        }
    }

    record EditionAnswer(
            int number,
            LocalDate decidedOn,
            String decidedBy,
            LocalDate validUntil,
            String basis,
            int pieces,
            int defectivePieces,
            int goodPieces,
            int greyPieces) {

        static EditionAnswer of(Edition edition) {
            return new EditionAnswer(
                    edition.number(),
                    edition.decidedOn(),
                    edition.decidedBy(),
                    edition.validUntil(),
                    edition.basis().word(),
                    edition.pieces(),
                    edition.defective(),
                    edition.good(),
                    edition.grey());
        }
    }

    record SetAnswer(long id, String code, String task, List<EditionAnswer> editions) {}

    record PieceAnswer(
            long id,
            String label,
            String trueState,
            @Nullable String defectKind,
            @Nullable String zone) {

        static PieceAnswer of(EditionPiece piece) {
            Zone zone = piece.zone();
            return new PieceAnswer(
                    piece.id(),
                    piece.label(),
                    piece.trueState().word(),
                    piece.defectKind(),
                    zone == null ? null : zone.words());
        }
    }

    @Operation(summary = "Enter a reference set with its first edition", responses = @ApiResponse(responseCode = "201"))
    @PostMapping
    ResponseEntity<SetAnswer> create(Actor actor, @Valid @RequestBody NewSetBody body) {
        Task task = tasks.byCode(actor.site(), body.task())
                .orElseThrow(() -> new Refusal(Refusal.Kind.INVALID, "unknown-task", body.task()));
        ReferenceSet created = sets.create(actor, task, body.toSet());
        return ResponseEntity.created(address(created.code())).body(answer(created));
    }

    @Operation(summary = "The reference sets, by code")
    @GetMapping
    Listing<SetAnswer> list(
            Actor actor,
            @RequestParam(required = false) @Nullable String after,
            @RequestParam(defaultValue = "100") int limit) {
        Listing<ReferenceSet> page = Listing.page(sets.all(actor.site()), ReferenceSet::code, after, limit);
        return new Listing<>(page.items().stream().map(this::answer).toList(), page.next());
    }

    @Operation(summary = "One reference set with its editions, without true states")
    @GetMapping("/{code}")
    SetAnswer read(Actor actor, @PathVariable String code) {
        return answer(find(actor, code));
    }

    /** The answer key: scope {@code key:read}; the reading is recorded. */
    @Operation(summary = "The answer key of the newest edition; the reading is recorded")
    @GetMapping("/{code}/pieces")
    Listing<PieceAnswer> pieces(Actor actor, @PathVariable String code) {
        ReferenceSet set = find(actor, code);
        List<EditionPiece> key = sets.readKey(actor, set, sets.newest(set).number(), "/api/v1/sets/pieces");
        return new Listing<>(key.stream().map(PieceAnswer::of).toList(), null);
    }

    private ReferenceSet find(Actor actor, String code) {
        return sets.byCode(actor.site(), code)
                .orElseThrow(() -> new Refusal(Refusal.Kind.NOT_FOUND, "unknown-set", code));
    }

    private SetAnswer answer(ReferenceSet set) {
        List<EditionAnswer> editions =
                sets.editions(set).stream().map(EditionAnswer::of).toList();
        return new SetAnswer(
                set.id(), set.code(), tasks.get(set.site(), set.taskId()).code(), editions);
    }

    private static URI address(String code) {
        return UriComponentsBuilder.fromPath("/api/v1/sets")
                .pathSegment(code)
                .encode()
                .build()
                .toUri();
    }
}
