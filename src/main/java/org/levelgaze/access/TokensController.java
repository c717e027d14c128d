package org.levelgaze.access;

import jakarta.servlet.http.HttpServletResponse;
import java.time.ZoneId;
import java.util.List;
import java.util.Set;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.Sites;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;

/** The tokens of a site's programs, for its administrators. */
@Controller
@RequestMapping("/settings/tokens")
class TokensController {

    private final Tokens tokens;
    private final Sites sites;

    TokensController(Tokens tokens, Sites sites) {
        this.tokens = tokens;
        this.sites = sites;
    }

    @GetMapping
    String list(Actor actor, Model model) {
        return page(actor, "", Set.of(), model);
    }

    /** The secret is in this answer alone: it goes through no session and no address. */
    @PostMapping
    String create(
            Actor actor,
            @RequestParam(defaultValue = "") String label,
            @RequestParam(defaultValue = "") Set<Scope> scopes,
            Model model,
            HttpServletResponse response) {
        try {
            model.addAttribute("made", tokens.create(actor, label, scopes));
            return page(actor, "", Set.of(), model);
        } catch (Refusal refusal) {
            FormFault.show(refusal, model, response);
            return page(actor, label, scopes, model);
        }
    }

    @PostMapping("/{id}/revocation")
    String revoke(Actor actor, @PathVariable long id, RedirectAttributes next) {
        tokens.revoke(actor, id);
        next.addFlashAttribute("notice", "access.tokens.revoked");
        return "redirect:/settings/tokens";
    }

    private String page(Actor actor, String label, Set<Scope> scopes, Model model) {
        ZoneId zone = sites.get(actor.site()).zone();
        model.addAttribute("label", label);
        model.addAttribute("scopes", scopes);
        model.addAttribute("allScopes", List.of(Scope.values()));
        model.addAttribute("tokens", tokens.all(actor.site()));
        model.addAttribute("zone", zone);
        return "access/tokens";
    }
}
