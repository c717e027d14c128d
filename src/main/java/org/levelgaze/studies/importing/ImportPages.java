package org.levelgaze.studies.importing;

import java.io.IOException;
import java.io.InputStream;
import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.Sites;
import org.levelgaze.studies.ImportOutcome;
import org.levelgaze.studies.reading.Sketch;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import org.springframework.ui.Model;
import org.springframework.validation.BeanPropertyBindingResult;
import org.springframework.validation.BindingResult;

/** Puts together what the pages of an import show. */
@Component
class ImportPages {

    private final Uploads uploads;
    private final ImportForms forms;
    private final ImportPapers papers;
    private final Sites sites;
    private final MessageSource messages;

    ImportPages(Uploads uploads, ImportForms forms, ImportPapers papers, Sites sites, MessageSource messages) {
        this.uploads = uploads;
        this.forms = forms;
        this.papers = papers;
        this.sites = sites;
        this.messages = messages;
    }

    /**
     * The page on which a file is chosen.
     *
     * @param instead the upload that it is to replace; null: none
     */
    String choose(Actor actor, @Nullable UUID instead, Model model) {
        model.addAttribute("instead", instead);
        model.addAttribute("uploads", uploads.open(actor));
        model.addAttribute("largest", uploads.largest());
        model.addAttribute("longExample", Examples.LONG.text());
        model.addAttribute("wideExample", Examples.WIDE.text());
        return "studies/import-choose";
    }

    /** The page that fits the state of an upload. */
    String show(Actor actor, Upload upload, Model model, Locale locale) {
        if (upload.studyId() != null) {
            return "redirect:/studies/" + upload.studyId();
        }
        if (upload.running()) {
            return progress(upload, model);
        }
        Optional<ImportOutcome.Asked> asked = questions(upload);
        if (asked.isPresent()) {
            QuestionForm empty =
                    QuestionForm.empty(asked.get().unknownAppraisers().size());
            return ask(upload, asked.get(), new BeanPropertyBindingResult(empty, "form"), model);
        }
        Sketch sketch = sketch(upload);
        ImportForm form = forms.found(actor, upload, sketch);
        return form(actor, upload, sketch, new BeanPropertyBindingResult(form, "form"), model, locale);
    }

    /** The page that shows how far a run is, and asks itself again. */
    String progress(Upload upload, Model model) {
        model.addAttribute("upload", upload);
        model.addAttribute("refresh", 2);
        return "studies/import-progress";
    }

    /** The page that asks what a file is. */
    String form(Actor actor, Upload upload, Sketch sketch, BeanPropertyBindingResult form, Model model, Locale locale) {
        ImportForm typed = (ImportForm) form.getTarget();
        model.addAttribute("upload", upload);
        model.addAttribute("sketch", sketch);
        model.addAttribute("form", typed);
        model.addAttribute(BindingResult.MODEL_KEY_PREFIX + "form", form);
        model.addAttribute("today", sites.today(actor.site()));
        model.addAttribute("tasks", tasks(actor, locale));
        model.addAttribute("sets", sets(actor, typed == null ? "" : typed.task(), locale));
        model.addAttribute("roles", ColumnRole.values());
        Optional<Refusal> refusal = papers.problem(upload).map(ImportProblem::refusal);
        model.addAttribute("refusal", form.hasErrors() ? null : refusal.orElse(null));
        return "studies/import-form";
    }

    /** The page that asks before anything new is entered. */
    String ask(Upload upload, ImportOutcome.Asked asked, BeanPropertyBindingResult form, Model model) {
        model.addAttribute("upload", upload);
        model.addAttribute("asked", asked);
        model.addAttribute("order", papers.order(upload).orElseThrow());
        model.addAttribute("form", form.getTarget());
        model.addAttribute(BindingResult.MODEL_KEY_PREFIX + "form", form);
        return "studies/import-questions";
    }

    /** What must be said yes to, if the last run asked. */
    Optional<ImportOutcome.Asked> questions(Upload upload) {
        return papers.problem(upload).map(ImportProblem::questions);
    }

    Sketch sketch(Upload upload) {
        try (InputStream content = uploads.content(upload)) {
            return Sketch.of(content);
        } catch (IOException e) {
            throw new IllegalStateException("The upload " + upload.id() + " cannot be read back", e);
        }
    }

    private Map<String, String> tasks(Actor actor, Locale locale) {
        Map<String, String> options = new LinkedHashMap<>();
        options.put("", messages.getMessage("studies.import.task.choose", null, locale));
        forms.tasks(actor.site())
                .forEach(task -> options.put(Long.toString(task.id()), task.code() + " · " + task.name()));
        options.put(ImportForm.NEW, messages.getMessage("studies.import.task.new", null, locale));
        return options;
    }

    private Map<String, String> sets(Actor actor, String task, Locale locale) {
        Map<String, String> options = new LinkedHashMap<>();
        options.put("", messages.getMessage("studies.import.set.choose", null, locale));
        forms.sets(actor.site(), task).forEach(set -> options.put(Long.toString(set.id()), set.code()));
        options.put(ImportForm.NEW, messages.getMessage("studies.import.set.new", null, locale));
        return options;
    }
}
