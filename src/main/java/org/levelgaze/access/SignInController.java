package org.levelgaze.access;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.security.Principal;
import java.util.Objects;
import org.jspecify.annotations.Nullable;
import org.levelgaze.shared.Refusal;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;

@Controller
class SignInController {

    private final SignIn signIn;
    private final FirstSetup setup;
    private final Visits visits;

    SignInController(SignIn signIn, FirstSetup setup, Visits visits) {
        this.signIn = signIn;
        this.setup = setup;
        this.visits = visits;
    }

    /** What the page asks for. */
    record Form(String loginName, String password) {

        /** What was not sent is empty. */
        Form {
            loginName = Objects.requireNonNullElse(loginName, "");
            password = Objects.requireNonNullElse(password, "");
        }
    }

    @GetMapping("/sign-in")
    String ask(@RequestParam(required = false) @Nullable String after, @Nullable Principal signedIn, Model model) {
        if (!setup.isDone()) {
            return "redirect:/setup";
        }
        model.addAttribute("form", new Form("", ""));
        model.addAttribute("after", after == null ? "" : after);
        return signedIn == null ? "access/sign-in" : "redirect:/";
    }

    @PostMapping("/sign-in")
    String enter(
            @ModelAttribute("form") Form form, Model model, HttpServletRequest request, HttpServletResponse response) {
        try {
            Account account = signIn.check(form.loginName(), form.password(), request.getRemoteAddr());
            return "redirect:" + visits.enter(account, request, response);
        } catch (Refusal refusal) {
            FormFault.show(refusal, model, response);
            return "access/sign-in";
        }
    }

    @PostMapping("/sign-out")
    String leave(HttpServletRequest request) {
        visits.end(request);
        return "redirect:/sign-in?after=sign-out";
    }
}
