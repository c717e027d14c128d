package org.levelgaze.register;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.FieldFault;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.Words;
import org.springframework.stereotype.Component;
import org.springframework.validation.BindingResult;

/** Enters what the form of a task says; what cannot be taken is put beside its field. */
@Component
class TaskEntry {

    private static final Map<String, String> FIELDS = Map.of(
            "code-not-usable", "code",
            "task-exists", "code",
            "name-not-usable", "name");
    private static final Map<String, String> KIND_FIELDS = Map.of(
            "code-not-usable", "kinds",
            "name-not-usable", "kinds",
            "defect-kind-twice", "kinds",
            "word-not-known", "kinds");

    private final Tasks tasks;

    TaskEntry(Tasks tasks) {
        this.tasks = tasks;
    }

    /**
     * A task about to be entered.
     *
     * @param kinds one defect kind a line: code; name; severity, the last two optional
     */
    record Form(
            @Nullable String code,
            @Nullable String name,
            @Nullable String kinds) {}

    /** The task; null: the form has faults. */
    @Nullable
    Task create(Actor actor, Form form, BindingResult faults) {
        List<DefectKind> kinds = kinds(form, faults);
        if (faults.hasErrors()) {
            return null;
        }
        String code = text(form.code()).strip();
        String name = text(form.name()).isBlank() ? code : text(form.name()).strip();
        try {
            return tasks.create(actor, code, name, kinds);
        } catch (Refusal refusal) {
            Map<String, String> fields = "defect-kind-twice".equals(refusal.type()) ? KIND_FIELDS : FIELDS;
            FieldFault.show(refusal, faults, fields);
            return null;
        }
    }

    private static List<DefectKind> kinds(Form form, BindingResult faults) {
        List<DefectKind> kinds = new ArrayList<>();
        try {
            text(form.kinds())
                    .lines()
                    .filter(line -> !line.isBlank())
                    .map(TaskEntry::kind)
                    .forEach(kinds::add);
        } catch (Refusal refusal) {
            FieldFault.show(refusal, faults, KIND_FIELDS);
        }
        return kinds;
    }

    private static DefectKind kind(String line) {
        String[] parts = line.split(";", 3);
        String code = parts[0].strip();
        String name = parts.length > 1 && !parts[1].isBlank() ? parts[1].strip() : code;
        Severity severity = parts.length > 2 && !parts[2].isBlank()
                ? Words.read(code, parts[2].strip(), Severity::ofWord, "critical, major, minor")
                : null;
        return new DefectKind(code, name, severity);
    }

    private static String text(@Nullable String typed) {
        return typed == null ? "" : typed;
    }
}
