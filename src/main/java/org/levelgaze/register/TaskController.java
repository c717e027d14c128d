package org.levelgaze.register;

import jakarta.servlet.http.HttpServletResponse;
import java.util.List;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.Refusal;
import org.springframework.http.HttpStatus;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;

/** Tasks: the list, one of them, and the form to enter one. */
@Controller
class TaskController {

    private final Tasks tasks;
    private final TaskEntry entry;

    TaskController(Tasks tasks, TaskEntry entry) {
        this.tasks = tasks;
        this.entry = entry;
    }

    @GetMapping("/tasks")
    String list(Actor actor, Model model) {
        model.addAttribute("form", new TaskEntry.Form("", "", ""));
        model.addAttribute("tasks", tasks.all(actor.site()));
        return "register/tasks";
    }

    @PostMapping("/tasks")
    String create(
            Actor actor,
            @ModelAttribute("form") TaskEntry.Form form,
            BindingResult faults,
            Model model,
            HttpServletResponse response,
            RedirectAttributes next) {
        Task created = entry.create(actor, form, faults);
        if (created == null) {
            response.setStatus(HttpStatus.UNPROCESSABLE_CONTENT.value());
            model.addAttribute("tasks", tasks.all(actor.site()));
            return "register/tasks";
        }
        next.addFlashAttribute("notice", "register.tasks.entered");
        next.addFlashAttribute("noticeArguments", List.of(created.name()));
        next.addAttribute("code", created.code());
        return "redirect:/tasks/{code}";
    }

    @GetMapping("/tasks/{code}")
    String one(Actor actor, @PathVariable String code, Model model) {
        Task task = tasks.byCode(actor.site(), code)
                .orElseThrow(() -> new Refusal(Refusal.Kind.NOT_FOUND, "unknown-task", code));
        model.addAttribute("task", task);
        return "register/task";
    }
}
