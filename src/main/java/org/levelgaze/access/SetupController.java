package org.levelgaze.access;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.util.Locale;
import java.util.Objects;
import org.levelgaze.shared.Refusal;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestMapping;

@Controller
@RequestMapping("/setup")
class SetupController {

    private final FirstSetup setup;
    private final Visits visits;

    SetupController(FirstSetup setup, Visits visits) {
        this.setup = setup;
        this.visits = visits;
    }

    /** What the page asks for. */
    record Form(String code, String displayName, String loginName, String password, String repeated) {

        /** What was not sent is empty. */
        Form {
            code = Objects.requireNonNullElse(code, "");
            displayName = Objects.requireNonNullElse(displayName, "");
            loginName = Objects.requireNonNullElse(loginName, "");
            password = Objects.requireNonNullElse(password, "");
            repeated = Objects.requireNonNullElse(repeated, "");
        }

        NewAccount account(Locale language) {
            FormFault.refuseUnlessEqual(password, repeated);
            return new NewAccount(loginName, displayName, password, FirstSetup.FIRST_ROLES, language);
        }
    }

    @GetMapping
    String ask(Model model) {
        refuseWhenDone();
        model.addAttribute("form", new Form("", "", "", "", ""));
        return "access/setup";
    }

    @PostMapping
    String complete(
            @ModelAttribute("form") Form form,
            Model model,
            Locale language,
            HttpServletRequest request,
            HttpServletResponse response) {
        refuseWhenDone();
        try {
            visits.enter(setup.complete(form.code(), form.account(language)), request, response);
            return "redirect:/";
        } catch (Refusal refusal) {
            FormFault.show(refusal, model, response);
            return "access/setup";
        }
    }

    private void refuseWhenDone() {
        if (setup.isDone()) {
            throw new Refusal(Refusal.Kind.NOT_FOUND, "setup-done");
        }
    }
}
