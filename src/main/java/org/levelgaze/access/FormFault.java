package org.levelgaze.access;

import jakarta.servlet.http.HttpServletResponse;
import org.levelgaze.shared.Refusal;
import org.springframework.http.HttpStatus;
import org.springframework.ui.Model;

/** Shows what a form was refused for on the form itself, which keeps what was typed. */
final class FormFault {

    private FormFault() {}

    static void show(Refusal refusal, Model model, HttpServletResponse response) {
        if (refusal.kind() == Refusal.Kind.NOT_FOUND) {
            throw refusal;
        }
        HttpStatus status = refusal.kind() == Refusal.Kind.TOO_MANY
                ? HttpStatus.TOO_MANY_REQUESTS
                : HttpStatus.UNPROCESSABLE_CONTENT;
        response.setStatus(status.value());
        model.addAttribute("refusal", refusal);
    }

    /**
     * Refuses a new password that was typed in two ways.
     *
     * @throws Refusal {@code passwords-differ}
     */
    static void refuseUnlessEqual(String password, String repeated) {
        if (!password.equals(repeated)) {
            throw new Refusal(Refusal.Kind.INVALID, "passwords-differ");
        }
    }
}
