package org.levelgaze.studies.pages;

import jakarta.servlet.http.HttpServletResponse;
import java.util.List;
import java.util.Locale;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.Appraiser;
import org.levelgaze.register.AppraiserKind;
import org.levelgaze.shared.Site;
import org.springframework.http.HttpStatus;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;

/** Appraisers: the list, one over time, and the forms to enter one or a camera's configuration. */
@Controller
class AppraiserController {

    private final AppraiserPages pages;
    private final AppraiserEntry entry;

    AppraiserController(AppraiserPages pages, AppraiserEntry entry) {
        this.pages = pages;
        this.entry = entry;
    }

    @GetMapping("/appraisers")
    String list(Actor actor, Locale locale, Model model) {
        model.addAttribute("form", new AppraiserEntry.Form("", "", AppraiserKind.PERSON));
        return listed(actor, locale, model);
    }

    @PostMapping("/appraisers")
    String create(
            Actor actor,
            @ModelAttribute("form") AppraiserEntry.Form form,
            BindingResult faults,
            Locale locale,
            Model model,
            HttpServletResponse response,
            RedirectAttributes next) {
        Appraiser created = entry.create(actor, form, faults);
        return created == null ? again(response, listed(actor, locale, model)) : entered(created, next);
    }

    @GetMapping("/appraisers/{code}")
    String one(Actor actor, @PathVariable String code, Locale locale, Model model) {
        model.addAttribute("form", new AppraiserEntry.ConfigurationForm("", "", ""));
        return shown(actor, code, locale, model);
    }

    @PostMapping("/appraisers/{code}/configurations")
    String configure(
            Actor actor,
            Site site,
            @PathVariable String code,
            @ModelAttribute("form") AppraiserEntry.ConfigurationForm form,
            BindingResult faults,
            Locale locale,
            Model model,
            HttpServletResponse response,
            RedirectAttributes next) {
        Appraiser changed = entry.configure(actor, site, code, form, faults);
        return changed == null ? again(response, shown(actor, code, locale, model)) : entered(changed, next);
    }

    private String listed(Actor actor, Locale locale, Model model) {
        model.addAttribute("list", pages.list(actor.site(), locale));
        return "studies/appraisers";
    }

    private String shown(Actor actor, String code, Locale locale, Model model) {
        model.addAttribute("page", pages.page(actor.site(), code, locale));
        return "studies/appraiser";
    }

    private static String again(HttpServletResponse response, String view) {
        response.setStatus(HttpStatus.UNPROCESSABLE_CONTENT.value());
        return view;
    }

    private static String entered(Appraiser appraiser, RedirectAttributes next) {
        next.addFlashAttribute("notice", "studies.appraisers.entered");
        next.addFlashAttribute("noticeArguments", List.of(appraiser.name()));
        next.addAttribute("code", appraiser.code());
        return "redirect:/appraisers/{code}";
    }
}
