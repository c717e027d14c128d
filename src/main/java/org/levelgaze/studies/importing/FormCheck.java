package org.levelgaze.studies.importing;

import java.time.LocalDate;
import java.time.format.DateTimeParseException;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.AppraiserKind;
import org.levelgaze.register.Task;
import org.levelgaze.register.Tasks;
import org.levelgaze.sets.ReferenceSet;
import org.levelgaze.sets.ReferenceSets;
import org.levelgaze.shared.Sites;
import org.levelgaze.studies.Consent;
import org.levelgaze.studies.reading.Layout;
import org.levelgaze.studies.reading.Sketch;
import org.levelgaze.studies.reading.Words;
import org.springframework.stereotype.Component;
import org.springframework.validation.Errors;

/** Checks the form that says what a file is; every fault is noted beside its field. */
@Component
class FormCheck {

    private final ImportForms forms;
    private final Tasks tasks;
    private final ReferenceSets sets;
    private final Sites sites;

    FormCheck(ImportForms forms, Tasks tasks, ReferenceSets sets, Sites sites) {
        this.forms = forms;
        this.tasks = tasks;
        this.sets = sets;
        this.sites = sites;
    }

    /** The order that a form gives; none when it has faults. */
    Optional<ImportOrder> order(Actor actor, ImportForm form, Sketch sketch, Errors errors) {
        String task = task(actor, form, errors);
        String set = set(actor, form, errors);
        LocalDate day = day(actor, form, errors);
        Optional<Layout> layout = new LayoutAnswers(sketch.columns(), form.columns(), errors).layout();
        Words words = words(form, errors);
        if (errors.hasErrors() || day == null || layout.isEmpty()) {
            return Optional.empty();
        }
        // choosing "a new set" on the form is the yes to it; everything else is asked when the file is read
        Consent consent =
                new Consent(form.hasNewSet(), form.hasNewTask(), false, Map.<String, AppraiserKind>of(), false);
        return Optional.of(new ImportOrder(
                form,
                task,
                form.hasNewTask() ? form.newTaskName() : null,
                set,
                day,
                form.configuration().isEmpty() ? null : form.configuration(),
                new Mapping(layout.get(), words),
                consent));
    }

    private String task(Actor actor, ImportForm form, Errors errors) {
        if (!form.hasNewTask()) {
            Optional<Task> known = forms.task(actor.site(), form.task());
            if (known.isEmpty()) {
                reject(errors, "task", "task");
            }
            return known.map(Task::code).orElse("");
        }
        if (form.newTaskCode().isEmpty()) {
            reject(errors, "newTaskCode", "task-code");
        } else if (tasks.byCode(actor.site(), form.newTaskCode()).isPresent()) {
            reject(errors, "newTaskCode", "task-taken", form.newTaskCode());
        }
        if (form.newTaskName().isEmpty()) {
            reject(errors, "newTaskName", "task-name");
        }
        return form.newTaskCode();
    }

    private String set(Actor actor, ImportForm form, Errors errors) {
        if (!form.hasNewSet()) {
            Optional<ReferenceSet> known = forms.sets(actor.site(), form.task()).stream()
                    .filter(set -> Long.toString(set.id()).equals(form.set()))
                    .findFirst();
            if (known.isEmpty()) {
                reject(errors, "set", "set");
            }
            return known.map(ReferenceSet::code).orElse("");
        }
        if (form.newSetCode().isEmpty()) {
            reject(errors, "newSetCode", "set-code");
        } else if (sets.byCode(actor.site(), form.newSetCode()).isPresent()) {
            reject(errors, "newSetCode", "set-taken", form.newSetCode());
        }
        if (form.columns().stream().noneMatch(column -> column.is(ColumnRole.REFERENCE))) {
            reject(errors, "set", "set-without-truths");
        }
        return form.newSetCode();
    }

    private @Nullable LocalDate day(Actor actor, ImportForm form, Errors errors) {
        try {
            LocalDate day = LocalDate.parse(form.performedOn());
            if (day.isAfter(sites.today(actor.site()))) {
                reject(errors, "performedOn", "day-ahead");
            }
            return day;
        } catch (DateTimeParseException e) {
            reject(errors, "performedOn", "day");
            return null;
        }
    }

    private static Words words(ImportForm form, Errors errors) {
        Map<String, Set<String>> by = new HashMap<>();
        gather("callWords", form.callWords(), Set.of(Answers.ACCEPT, Answers.REJECT), by, errors);
        gather("truthWords", form.truthWords(), Set.of(Answers.GOOD, Answers.DEFECTIVE), by, errors);
        return new Words(
                by.getOrDefault(Answers.ACCEPT, Set.of()),
                by.getOrDefault(Answers.REJECT, Set.of()),
                by.getOrDefault(Answers.GOOD, Set.of()),
                by.getOrDefault(Answers.DEFECTIVE, Set.of()));
    }

    private static void gather(
            String field, List<WordChoice> choices, Set<String> meanings, Map<String, Set<String>> by, Errors errors) {
        Map<String, String> said = new HashMap<>();
        for (int at = 0; at < choices.size(); at++) {
            WordChoice choice = choices.get(at);
            String before = said.putIfAbsent(Words.plain(choice.word()), choice.meaning());
            boolean understood =
                    meanings.contains(choice.meaning()) && (before == null || before.equals(choice.meaning()));
            if (understood) {
                by.computeIfAbsent(choice.meaning(), key -> new LinkedHashSet<>())
                        .add(choice.word());
            } else {
                reject(errors, field + "[" + at + "].meaning", "word", choice.word());
            }
        }
    }

    private static void reject(Errors errors, String field, String fault, Object... arguments) {
        errors.rejectValue(field, "studies.import.fault." + fault, arguments, null);
    }
}
