package org.levelgaze.studies.importing;

import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.util.Locale;
import java.util.Optional;
import java.util.UUID;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.Refusal;
import org.levelgaze.studies.Consent;
import org.levelgaze.studies.ImportOutcome;
import org.springframework.http.HttpHeaders;
import org.springframework.http.HttpStatus;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BeanPropertyBindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;

/** A run of an import: how far it is, what it asks, what stood in its way. */
@Controller
@RequestMapping("/studies/import/{id}")
class ImportRunController {

    private final Uploads uploads;
    private final ImportRuns runs;
    private final ImportPages pages;
    private final ImportPapers papers;
    private final BadRowsFile badRows;

    ImportRunController(Uploads uploads, ImportRuns runs, ImportPages pages, ImportPapers papers, BadRowsFile badRows) {
        this.uploads = uploads;
        this.runs = runs;
        this.pages = pages;
        this.papers = papers;
        this.badRows = badRows;
    }

    /** The part of the page that asks itself again; once the run has ended, the browser is sent to what came of it. */
    @GetMapping("/progress")
    String progress(Actor actor, @PathVariable UUID id, Model model, HttpServletResponse response) {
        Upload upload = uploads.get(actor, id);
        if (!upload.running()) {
            response.setHeader("HX-Redirect", "/studies/import/" + id);
        }
        return pages.progress(upload, model) + " :: state";
    }

    @PostMapping("/stop")
    String stop(Actor actor, @PathVariable UUID id) {
        uploads.wantCancel(uploads.get(actor, id));
        return "redirect:/studies/import/" + id;
    }

    @PostMapping("/answers")
    String answer(
            Actor actor,
            @PathVariable UUID id,
            QuestionForm typed,
            Model model,
            HttpServletResponse response,
            RedirectAttributes flash) {
        Upload upload = uploads.get(actor, id);
        Optional<ImportOutcome.Asked> asked = pages.questions(upload);
        if (asked.isEmpty()) {
            return "redirect:/studies/import/" + id;
        }
        if (typed.saysSlip()) {
            flash.addFlashAttribute("notice", "studies.import.slip.notice");
            return "redirect:/studies/import?instead=" + id;
        }
        return answer(actor, upload, asked.get(), typed, model, response);
    }

    private String answer(
            Actor actor,
            Upload upload,
            ImportOutcome.Asked asked,
            QuestionForm typed,
            Model model,
            HttpServletResponse response) {
        QuestionForm form = typed.sized(asked.unknownAppraisers().size());
        BeanPropertyBindingResult errors = new BeanPropertyBindingResult(form, "form");
        ImportOrder order = papers.order(upload).orElseThrow();
        Optional<Consent> consent = QuestionCheck.consent(asked, form, order.consent(), errors);
        if (consent.isEmpty()) {
            response.setStatus(HttpStatus.UNPROCESSABLE_CONTENT.value());
            return pages.ask(upload, asked, errors, model);
        }
        runs.start(actor, upload, order.with(consent.get()));
        return "redirect:/studies/import/" + upload.id();
    }

    /** All rows that stood in the way, not only those that the page lists. */
    @GetMapping("/bad-rows.csv")
    void badRows(Actor actor, @PathVariable UUID id, Locale locale, HttpServletResponse response) throws IOException {
        Upload upload = uploads.get(actor, id);
        ImportOrder order =
                papers.order(upload).orElseThrow(() -> new Refusal(Refusal.Kind.CONFLICT, "import-not-tried"));
        response.setContentType("text/csv;charset=UTF-8");
        response.setHeader(HttpHeaders.CONTENT_DISPOSITION, ImportController.attachment("rows-to-correct.csv"));
        badRows.write(upload, order, locale, response.getOutputStream());
    }
}
