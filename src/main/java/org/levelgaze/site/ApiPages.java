package org.levelgaze.site;

import jakarta.servlet.http.HttpServletRequest;
import java.io.IOException;
import java.util.Locale;
import org.levelgaze.shared.Refusal;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;

/** The pages about the API: what can be called, and what a problem means. */
@Controller
class ApiPages {

    private final ApiDocument document;
    private final Sentences words;

    ApiPages(ApiDocument document, Sentences words) {
        this.document = document;
        this.words = words;
    }

    @GetMapping("/api")
    String calls(HttpServletRequest request, Locale locale, Model model) throws IOException {
        model.addAttribute("calls", document.calls(request, locale));
        return "site/api";
    }

    @GetMapping("/problems/{type}")
    String problem(@PathVariable String type, Locale locale, Model model) {
        String sentence = words.pattern(type, locale)
                .orElseThrow(() -> new Refusal(Refusal.Kind.NOT_FOUND, "problem-not-known", type));
        model.addAttribute("type", type);
        model.addAttribute("sentence", sentence);
        return "site/problem";
    }
}
