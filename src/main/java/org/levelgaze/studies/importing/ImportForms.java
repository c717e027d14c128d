package org.levelgaze.studies.importing;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.Task;
import org.levelgaze.register.Tasks;
import org.levelgaze.sets.ReferenceSet;
import org.levelgaze.sets.ReferenceSets;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.RowError;
import org.levelgaze.shared.SiteId;
import org.levelgaze.studies.reading.Sketch;
import org.levelgaze.studies.reading.Words;
import org.springframework.stereotype.Component;

/** Fills the form that asks what a file is: with what was typed, what is remembered for the task, and what can be guessed. */
@Component
class ImportForms {

    private static final ImportForm EMPTY =
            new ImportForm(null, null, null, null, null, null, null, null, null, null, null);

    private final Tasks tasks;
    private final ReferenceSets sets;
    private final Mappings mappings;
    private final ImportPapers papers;

    ImportForms(Tasks tasks, ReferenceSets sets, Mappings mappings, ImportPapers papers) {
        this.tasks = tasks;
        this.sets = sets;
        this.mappings = mappings;
        this.papers = papers;
    }

    /** The form as the user left it, or the first one. */
    ImportForm found(Actor actor, Upload upload, Sketch sketch) {
        ImportForm typed = papers.order(upload)
                .map(order -> upload.state() == Upload.State.WAITING ? forAnotherFile(order, sketch) : order.form())
                .orElseGet(() -> guessed(sketch));
        Refusal refusal = papers.problem(upload).map(ImportProblem::refusal).orElse(null);
        return filled(actor, typed, sketch, refusal == null ? List.of() : refusal.rows());
    }

    /** The form again, after something in it has changed; what was typed stays. */
    ImportForm again(Actor actor, ImportForm typed, Sketch sketch) {
        return filled(actor, typed, sketch, List.of());
    }

    private static ImportForm guessed(Sketch sketch) {
        var guess = sketch.guess();
        List<ColumnChoice> columns = Answers.columns(guess.layout(), sketch.columns());
        return EMPTY.withMeaning(
                columns,
                Answers.words(sketch.columns(), columns, ColumnRole.CALL, List.of(), Answers.ofCalls(guess.words())),
                Answers.words(
                        sketch.columns(), columns, ColumnRole.REFERENCE, List.of(), Answers.ofTruths(guess.words())),
                "");
    }

    /** What was said about a file that another one replaces, as far as it can hold for that one. */
    private static ImportForm forAnotherFile(ImportOrder order, Sketch sketch) {
        Mapping said = order.mapping();
        if (!Answers.fits(said.layout(), sketch)) {
            ImportForm guessed = guessed(sketch);
            return order.form()
                    .withMeaning(
                            guessed.columns(),
                            order.form().callWords(),
                            order.form().truthWords(),
                            order.form().task());
        }
        List<ColumnChoice> columns = Answers.columns(said.layout(), sketch.columns());
        return order.form()
                .withMeaning(
                        columns,
                        order.form().callWords(),
                        order.form().truthWords(),
                        order.form().task());
    }

    private ImportForm filled(Actor actor, ImportForm typed, Sketch sketch, List<RowError> bad) {
        List<Task> known = tasks.all(actor.site());
        String task = chosenTask(typed, known);
        ImportForm form = typed.withTaskAndSet(task, chosenSet(typed, task, sets(actor.site(), task)));
        Optional<Mapping> remembered = form.mappedTask().equals(task)
                ? Optional.empty()
                : task(known, task).flatMap(mappings::of);
        List<ColumnChoice> columns = remembered
                .filter(mapping -> Answers.fits(mapping.layout(), sketch))
                .map(mapping -> Answers.columns(mapping.layout(), sketch.columns()))
                .orElseGet(() -> padded(form.columns(), sketch.columns().size()));
        Words words = remembered.map(Mapping::words).orElse(Words.standard()).withKnown();
        return form.withMeaning(
                columns,
                words(sketch, columns, ColumnRole.CALL, form.callWords(), Answers.ofCalls(words), remembered, bad),
                words(
                        sketch,
                        columns,
                        ColumnRole.REFERENCE,
                        form.truthWords(),
                        Answers.ofTruths(words),
                        remembered,
                        bad),
                task);
    }

    /** What was typed goes before what is known of old, but not before what is remembered for a task just chosen. */
    private static List<WordChoice> words(
            Sketch sketch,
            List<ColumnChoice> columns,
            ColumnRole role,
            List<WordChoice> typed,
            Map<String, String> known,
            Optional<Mapping> remembered,
            List<RowError> bad) {
        Map<String, String> meanings = new HashMap<>(remembered.isPresent() ? Answers.said(typed) : known);
        meanings.putAll(remembered.isPresent() ? known : Answers.said(typed));
        List<String> further = new ArrayList<>();
        for (RowError row : bad) {
            boolean ofRole = column(sketch, row.column())
                    .filter(at -> columns.get(at).is(role))
                    .isPresent();
            if (ofRole && row.message().equals("studies.row.word")) {
                further.add(row.value());
            }
        }
        typed.forEach(choice -> further.add(choice.word()));
        boolean asked = columns.stream().anyMatch(column -> column.is(role));
        return asked ? Answers.words(sketch.columns(), columns, role, further, meanings) : typed;
    }

    private static Optional<Integer> column(Sketch sketch, String name) {
        for (int at = 0; at < sketch.columns().size(); at++) {
            if (sketch.columns().get(at).name().equals(name)) {
                return Optional.of(at);
            }
        }
        return Optional.empty();
    }

    private static List<ColumnChoice> padded(List<ColumnChoice> columns, int size) {
        List<ColumnChoice> padded = new ArrayList<>(columns.subList(0, Math.min(size, columns.size())));
        while (padded.size() < size) {
            padded.add(ColumnChoice.LEFT_OUT);
        }
        return padded;
    }

    private static String chosenTask(ImportForm form, List<Task> known) {
        if (known.isEmpty() || form.hasNewTask()) {
            return ImportForm.NEW;
        }
        boolean only = form.task().isEmpty() && known.size() == 1;
        return only
                ? Long.toString(known.get(0).id())
                : task(known, form.task()).map(one -> form.task()).orElse("");
    }

    private static String chosenSet(ImportForm form, String task, List<ReferenceSet> known) {
        if (task.isEmpty() || (form.hasNewSet() && task.equals(form.mappedTask()))) {
            return form.set();
        }
        boolean stillThere =
                known.stream().anyMatch(set -> Long.toString(set.id()).equals(form.set()));
        return stillThere ? form.set() : known.isEmpty() ? ImportForm.NEW : "";
    }

    private static Optional<Task> task(List<Task> known, String number) {
        return known.stream()
                .filter(task -> Long.toString(task.id()).equals(number))
                .findFirst();
    }

    /** The task that a form names by its number, if it is known. */
    Optional<Task> task(SiteId site, String number) {
        return task(tasks.all(site), number);
    }

    /** The sets of a task, by its number in the form. */
    List<ReferenceSet> sets(SiteId site, @Nullable String task) {
        return sets.all(site).stream()
                .filter(set -> Long.toString(set.taskId()).equals(task))
                .toList();
    }

    /** The tasks of a site. */
    List<Task> tasks(SiteId site) {
        return tasks.all(site);
    }
}
