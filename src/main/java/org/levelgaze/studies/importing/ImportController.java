package org.levelgaze.studies.importing;

import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.Locale;
import java.util.Optional;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.Refusal;
import org.levelgaze.studies.reading.Limits;
import org.levelgaze.studies.reading.Sketch;
import org.springframework.http.ContentDisposition;
import org.springframework.http.HttpHeaders;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BeanPropertyBindingResult;
import org.springframework.web.bind.WebDataBinder;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.InitBinder;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.multipart.MultipartFile;

/** A file is brought, and what it is gets said. */
@Controller
@RequestMapping("/studies/import")
class ImportController {

    private final Uploads uploads;
    private final ImportForms forms;
    private final FormCheck check;
    private final ImportRuns runs;
    private final ImportPages pages;

    ImportController(Uploads uploads, ImportForms forms, FormCheck check, ImportRuns runs, ImportPages pages) {
        this.uploads = uploads;
        this.forms = forms;
        this.check = check;
        this.runs = runs;
        this.pages = pages;
    }

    @InitBinder
    void allowManyColumns(WebDataBinder binder) {
        binder.setAutoGrowCollectionLimit(Limits.COLUMNS);
    }

    @GetMapping
    String choose(Actor actor, @RequestParam(required = false) @Nullable UUID instead, Model model) {
        return pages.choose(actor, instead, model);
    }

    /**
     * Keeps a file and asks what it is.
     *
     * @param instead the file that this one replaces; what was said about that one holds on
     */
    @PostMapping
    String keep(
            Actor actor,
            @RequestParam MultipartFile file,
            @RequestParam(required = false) @Nullable UUID instead,
            Model model,
            HttpServletResponse response)
            throws IOException {
        try (InputStream content = file.getInputStream()) {
            UUID kept = keep(actor, file, content);
            if (instead != null) {
                uploads.replace(actor, instead, kept);
            }
            return "redirect:/studies/import/" + kept;
        } catch (Refusal refusal) {
            boolean tooLarge = refusal.kind() == Refusal.Kind.TOO_LARGE;
            response.setStatus((tooLarge ? HttpStatus.CONTENT_TOO_LARGE : HttpStatus.UNPROCESSABLE_CONTENT).value());
            model.addAttribute("refusal", refusal);
            return pages.choose(actor, instead, model);
        }
    }

    private UUID keep(Actor actor, MultipartFile file, InputStream content) throws IOException {
        if (file.isEmpty()) {
            throw new Refusal(Refusal.Kind.INVALID, "file-empty");
        }
        try (InputStream beginning = file.getInputStream()) {
            Sketch.of(beginning);
        }
        String name = file.getOriginalFilename();
        return uploads.keep(actor, name == null ? "" : name, content);
    }

    @GetMapping("/{id}")
    String show(Actor actor, @PathVariable UUID id, Model model, Locale locale) {
        return pages.show(actor, uploads.get(actor, id), model, locale);
    }

    /** The form again with what a choice in it changes: the sets of the task, the words of the columns. */
    @PostMapping(path = "/{id}", params = "look")
    String look(Actor actor, @PathVariable UUID id, ImportForm typed, Model model, Locale locale) {
        Upload upload = uploads.get(actor, id);
        Sketch sketch = pages.sketch(upload);
        ImportForm form = forms.again(actor, typed, sketch);
        return pages.form(actor, upload, sketch, new BeanPropertyBindingResult(form, "form"), model, locale);
    }

    @PostMapping("/{id}")
    String order(
            Actor actor,
            @PathVariable UUID id,
            ImportForm typed,
            Model model,
            HttpServletResponse response,
            Locale locale) {
        Upload upload = uploads.get(actor, id);
        if (begun(upload)) {
            return "redirect:/studies/import/" + id;
        }
        Sketch sketch = pages.sketch(upload);
        ImportForm form = forms.again(actor, typed, sketch);
        BeanPropertyBindingResult errors = new BeanPropertyBindingResult(form, "form");
        Optional<ImportOrder> order = check.order(actor, form, sketch, errors);
        if (order.isEmpty() && !begun(uploads.get(actor, id))) {
            response.setStatus(HttpStatus.UNPROCESSABLE_CONTENT.value());
            return pages.form(actor, upload, sketch, errors, model, locale);
        }
        order.ifPresent(said -> runs.start(actor, upload, said));
        return "redirect:/studies/import/" + id;
    }

    /** The second of two clicks may find the task that the first has just entered: that is no fault of the form. */
    private static boolean begun(Upload upload) {
        return upload.running() || upload.studyId() != null;
    }

    @PostMapping("/{id}/away")
    String takeAway(Actor actor, @PathVariable UUID id) {
        uploads.forget(uploads.get(actor, id));
        return "redirect:/studies/import";
    }

    @GetMapping("/example-long.csv")
    ResponseEntity<String> longExample() {
        return example(Examples.LONG);
    }

    @GetMapping("/example-wide.csv")
    ResponseEntity<String> wideExample() {
        return example(Examples.WIDE);
    }

    private static ResponseEntity<String> example(Examples example) {
        return ResponseEntity.ok()
                .contentType(new MediaType("text", "csv", StandardCharsets.UTF_8))
                .header(HttpHeaders.CONTENT_DISPOSITION, attachment(example.fileName()))
                .body(example.text());
    }

    static String attachment(String name) {
        return ContentDisposition.attachment().filename(name).build().toString();
    }
}
