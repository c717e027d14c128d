package org.levelgaze.access;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.util.List;
import java.util.Locale;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.Refusal;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;

/** A person's own account. */
@Controller
@RequestMapping("/account")
class AccountController {

    /** The languages with complete texts. */
    static final List<String> LANGUAGES = List.of("en", "de");

    private final Accounts accounts;
    private final SignIn signIn;
    private final Visits visits;

    AccountController(Accounts accounts, SignIn signIn, Visits visits) {
        this.accounts = accounts;
        this.signIn = signIn;
        this.visits = visits;
    }

    @GetMapping
    String show(Actor actor, Model model) {
        model.addAttribute("account", own(actor));
        model.addAttribute("languages", LANGUAGES);
        return "access/account";
    }

    @PostMapping("/password")
    String changePassword(
            Actor actor,
            @RequestParam String present,
            @RequestParam String password,
            @RequestParam String repeated,
            Model model,
            HttpServletRequest request,
            HttpServletResponse response,
            RedirectAttributes next) {
        try {
            FormFault.refuseUnlessEqual(password, repeated);
            signIn.confirm(own(actor), present, request.getRemoteAddr());
            accounts.changePassword(actor, own(actor).id(), password);
            visits.goOn(own(actor), request, response);
            next.addFlashAttribute("notice", "access.account.password.changed");
            return "redirect:/account";
        } catch (Refusal refusal) {
            FormFault.show(refusal, model, response);
            return show(actor, model);
        }
    }

    @PostMapping("/language")
    String changeLanguage(
            Actor actor,
            @RequestParam String language,
            HttpServletRequest request,
            HttpServletResponse response,
            RedirectAttributes next) {
        if (!LANGUAGES.contains(language)) {
            throw new Refusal(Refusal.Kind.INVALID, "language", language);
        }
        accounts.changeLanguage(actor, own(actor).id(), Locale.forLanguageTag(language));
        visits.goOn(own(actor), request, response);
        next.addFlashAttribute("notice", "access.account.language.changed");
        return "redirect:/account";
    }

    private Account own(Actor actor) {
        long id = Long.parseLong(actor.who().substring("account:".length()));
        return accounts.find(actor.site(), id).orElseThrow();
    }
}
