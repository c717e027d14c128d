package org.levelgaze.studies.importing;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * What somebody said that a file is, as typed; checked by {@link FormCheck}.
 *
 * @param task the task's number, or {@link #NEW}
 * @param newTaskCode the code of a new task
 * @param newTaskName its name
 * @param set the set's number, or {@link #NEW}
 * @param newSetCode the code of a new set
 * @param performedOn the day
 * @param configuration the label of the camera configuration; empty: none named
 * @param columns what was said about the columns, in their order
 * @param callWords what was said about the words of the calls
 * @param truthWords what was said about the words of the true states
 * @param mappedTask the task whose remembered answers the form already shows; empty: none
 */
record ImportForm(
        String task,
        String newTaskCode,
        String newTaskName,
        String set,
        String newSetCode,
        String performedOn,
        String configuration,
        List<ColumnChoice> columns,
        List<WordChoice> callWords,
        List<WordChoice> truthWords,
        String mappedTask) {

    /** Stands for a task or a set that is not known yet. */
    static final String NEW = "new";

    /** Takes what a form leaves out as nothing said. */
    ImportForm(
            @Nullable String task,
            @Nullable String newTaskCode,
            @Nullable String newTaskName,
            @Nullable String set,
            @Nullable String newSetCode,
            @Nullable String performedOn,
            @Nullable String configuration,
            @Nullable List<@Nullable ColumnChoice> columns,
            @Nullable List<@Nullable WordChoice> callWords,
            @Nullable List<@Nullable WordChoice> truthWords,
            @Nullable String mappedTask) {
        this.task = Typed.text(task);
        this.newTaskCode = Typed.text(newTaskCode);
        this.newTaskName = Typed.text(newTaskName);
        this.set = Typed.text(set);
        this.newSetCode = Typed.text(newSetCode);
        this.performedOn = Typed.text(performedOn);
        this.configuration = Typed.text(configuration);
        this.columns = Typed.list(columns);
        this.callWords = Typed.list(callWords);
        this.truthWords = Typed.list(truthWords);
        this.mappedTask = Typed.text(mappedTask);
    }

    boolean hasNewTask() {
        return task.equals(NEW);
    }

    boolean hasNewSet() {
        return set.equals(NEW);
    }

    ImportForm withTaskAndSet(String newTask, String newSet) {
        return new ImportForm(
                newTask,
                newTaskCode,
                newTaskName,
                newSet,
                newSetCode,
                performedOn,
                configuration,
                List.copyOf(columns),
                List.copyOf(callWords),
                List.copyOf(truthWords),
                mappedTask);
    }

    ImportForm withMeaning(
            List<ColumnChoice> newColumns, List<WordChoice> newCalls, List<WordChoice> newTruths, String ofTask) {
        return new ImportForm(
                task,
                newTaskCode,
                newTaskName,
                set,
                newSetCode,
                performedOn,
                configuration,
                List.copyOf(newColumns),
                List.copyOf(newCalls),
                List.copyOf(newTruths),
                ofTask);
    }
}
