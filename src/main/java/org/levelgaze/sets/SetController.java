package org.levelgaze.sets;

import java.util.Locale;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.Sites;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;

/** Reference sets: the list, one of them, and its answer key after a recorded yes. */
@Controller
class SetController {

    private final SetPages pages;
    private final ReferenceSets sets;
    private final Sites sites;

    SetController(SetPages pages, ReferenceSets sets, Sites sites) {
        this.pages = pages;
        this.sets = sets;
        this.sites = sites;
    }

    @GetMapping("/sets")
    String list(Actor actor, Model model) {
        model.addAttribute("today", sites.today(actor.site()));
        model.addAttribute("lines", pages.list(actor.site()));
        return "sets/sets";
    }

    @GetMapping("/sets/{code}")
    String one(Actor actor, @PathVariable String code, Locale locale, Model model) {
        model.addAttribute("today", sites.today(actor.site()));
        model.addAttribute("page", pages.page(actor.site(), code, locale));
        return "sets/set";
    }

    /** Shows the key only to whose reading was recorded; asks everybody else first. */
    @GetMapping("/sets/{code}/key")
    String key(Actor actor, @PathVariable String code, Model model) {
        ReferenceSet set = pages.find(actor.site(), code);
        Edition newest = sets.newest(set);
        boolean seen = sets.hasReadKey(actor, set, newest.number());
        model.addAttribute("set", set);
        model.addAttribute("edition", newest);
        model.addAttribute("pieces", seen ? sets.piecesForScoring(set, newest.number()) : null);
        return "sets/key";
    }

    @PostMapping("/sets/{code}/key")
    String readKey(Actor actor, @PathVariable String code, RedirectAttributes next) {
        ReferenceSet set = pages.find(actor.site(), code);
        sets.readKey(actor, set, sets.newest(set).number(), "/sets/" + code + "/key");
        next.addAttribute("code", code);
        return "redirect:/sets/{code}/key";
    }
}
