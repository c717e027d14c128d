package org.levelgaze.access;

import jakarta.servlet.http.HttpServletResponse;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.Refusal;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;

/** The accounts of the people at a site, for its administrators. */
@Controller
@RequestMapping("/settings/accounts")
class AccountsController {

    private final Accounts accounts;

    AccountsController(Accounts accounts) {
        this.accounts = accounts;
    }

    /** What the form for a new account asks for. */
    record Form(
            String displayName,
            String loginName,
            String password,
            String language,
            @Nullable Set<Role> roles) {

        /** What was not sent is empty. */
        Form {
            displayName = Objects.requireNonNullElse(displayName, "");
            loginName = Objects.requireNonNullElse(loginName, "");
            password = Objects.requireNonNullElse(password, "");
            language = Objects.requireNonNullElse(language, "");
        }

        NewAccount account() {
            return new NewAccount(
                    loginName,
                    displayName,
                    password,
                    roles == null ? Set.of() : roles,
                    Locale.forLanguageTag(AccountController.LANGUAGES.contains(language) ? language : "en"));
        }
    }

    @ModelAttribute("allRoles")
    List<Role> allRoles() {
        return List.of(Role.values());
    }

    @ModelAttribute("languages")
    List<String> languages() {
        return AccountController.LANGUAGES;
    }

    @GetMapping
    String list(Actor actor, Locale language, Model model) {
        model.addAttribute("form", new Form("", "", "", language.getLanguage(), Set.of()));
        return page(actor, model);
    }

    @PostMapping
    String create(
            Actor actor,
            @ModelAttribute("form") Form form,
            Model model,
            HttpServletResponse response,
            RedirectAttributes next) {
        try {
            Account made = accounts.create(actor, form.account());
            return done(next, "access.accounts.created", made);
        } catch (Refusal refusal) {
            FormFault.show(refusal, model, response);
            return page(actor, model);
        }
    }

    @GetMapping("/{id}")
    String one(Actor actor, @PathVariable long id, Model model) {
        model.addAttribute("account", get(actor, id));
        return "access/one-account";
    }

    @PostMapping("/{id}/roles")
    String changeRoles(
            Actor actor,
            @PathVariable long id,
            @RequestParam(defaultValue = "") Set<Role> roles,
            Model model,
            HttpServletResponse response,
            RedirectAttributes next) {
        return change(actor, id, "roles-changed", () -> accounts.changeRoles(actor, id, roles), model, response, next);
    }

    @PostMapping("/{id}/password")
    String changePassword(
            Actor actor,
            @PathVariable long id,
            @RequestParam String password,
            Model model,
            HttpServletResponse response,
            RedirectAttributes next) {
        Runnable change = () -> accounts.changePassword(actor, id, password);
        return change(actor, id, "password-changed", change, model, response, next);
    }

    @PostMapping("/{id}/deactivation")
    String deactivate(
            Actor actor, @PathVariable long id, Model model, HttpServletResponse response, RedirectAttributes next) {
        return change(actor, id, "ended", () -> accounts.setActive(actor, id, false), model, response, next);
    }

    @PostMapping("/{id}/reactivation")
    String reactivate(
            Actor actor, @PathVariable long id, Model model, HttpServletResponse response, RedirectAttributes next) {
        return change(actor, id, "reopened", () -> accounts.setActive(actor, id, true), model, response, next);
    }

    private String change(
            Actor actor,
            long id,
            String notice,
            Runnable change,
            Model model,
            HttpServletResponse response,
            RedirectAttributes next) {
        try {
            change.run();
            return done(next, "access.accounts." + notice, get(actor, id));
        } catch (Refusal refusal) {
            FormFault.show(refusal, model, response);
            return one(actor, id, model);
        }
    }

    private static String done(RedirectAttributes next, String notice, Account account) {
        next.addFlashAttribute("notice", notice);
        next.addFlashAttribute("noticeArguments", List.of(account.displayName()));
        return "redirect:/settings/accounts";
    }

    private Account get(Actor actor, long id) {
        return accounts.find(actor.site(), id)
                .orElseThrow(() -> new Refusal(Refusal.Kind.NOT_FOUND, "unknown-account", Long.toString(id)));
    }

    private String page(Actor actor, Model model) {
        model.addAttribute("accounts", accounts.all(actor.site()));
        return "access/accounts";
    }
}
