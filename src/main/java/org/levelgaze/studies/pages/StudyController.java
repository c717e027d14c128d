package org.levelgaze.studies.pages;

import java.util.List;
import java.util.Locale;
import org.levelgaze.journal.Actor;
import org.levelgaze.studies.Studies;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;

/** The list of studies, a study, its summary, and its conclusion. */
@Controller
class StudyController {

    private final StudyLists lists;
    private final StudyPages pages;
    private final Studies studies;

    StudyController(StudyLists lists, StudyPages pages, Studies studies) {
        this.lists = lists;
        this.pages = pages;
        this.studies = studies;
    }

    @GetMapping("/studies")
    String list(Actor actor, StudyQuery query, Locale locale, Model model) {
        model.addAttribute("query", query);
        model.addAttribute("list", lists.list(actor.site(), query, locale));
        return "studies/list";
    }

    @GetMapping("/studies/{id}")
    String study(Actor actor, @PathVariable long id, Locale locale, Model model) {
        model.addAttribute("page", pages.page(actor.site(), id, locale));
        return "studies/study";
    }

    @GetMapping("/studies/{id}/summary")
    String summary(Actor actor, @PathVariable long id, Locale locale, Model model) {
        model.addAttribute("page", pages.page(actor.site(), id, locale));
        return "studies/summary";
    }

    @PostMapping("/studies/{id}/conclusion")
    String conclude(Actor actor, @PathVariable long id, RedirectAttributes next) {
        studies.conclude(actor, studies.get(actor.site(), id));
        next.addFlashAttribute("notice", "studies.concluded");
        next.addFlashAttribute("noticeArguments", List.of());
        return "redirect:/studies/" + id;
    }
}
