package org.levelgaze.studies.pages;

import java.util.Locale;
import org.levelgaze.journal.Actor;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;

/** The pieces of a study: asks first, since opening them counts as having seen the answer key. */
@Controller
class LadderController {

    private final Ladders ladders;

    LadderController(Ladders ladders) {
        this.ladders = ladders;
    }

    @GetMapping("/studies/{id}/pieces")
    String pieces(Actor actor, @PathVariable long id, Locale locale, Model model) {
        StudyHeading heading = ladders.heading(actor, id);
        boolean opened = ladders.opened(actor, heading);
        model.addAttribute("heading", heading);
        model.addAttribute("ladder", opened ? ladders.picture(heading, locale) : null);
        return "studies/pieces";
    }

    @PostMapping("/studies/{id}/pieces")
    String open(Actor actor, @PathVariable long id) {
        ladders.open(actor, ladders.heading(actor, id));
        return "redirect:/studies/" + id + "/pieces";
    }
}
