package org.levelgaze.site;

import jakarta.validation.Valid;
import jakarta.validation.constraints.NotBlank;
import java.time.LocalDate;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.jspecify.annotations.Nullable;
import org.levelgaze.plot.Picture;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.RowError;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestBody;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.ResponseBody;

/** Pages and calls that go wrong on purpose; known to the tests of this package alone. */
@Controller
class SampleController {

    record Form(
            @NotBlank String code,
            @Nullable String secret,
            @Nullable LocalDate day,
            @Nullable String kind,
            boolean sure,
            @Nullable String note) {}

    record Body(@NotBlank String code) {}

    @GetMapping("/sample")
    String form(Model model) {
        model.addAttribute("form", new Form("RIM & <b>", null, LocalDate.of(2026, 3, 9), "rim", true, null));
        return page(model);
    }

    @PostMapping("/sample")
    String keep(@Valid @ModelAttribute("form") Form form, BindingResult result, Model model) {
        return page(model);
    }

    private static String page(Model model) {
        model.addAttribute("kinds", new TreeMap<>(Map.of("rim", "Rim", "glaze", "Glaze")));
        model.addAttribute("notice", "site.pager.page");
        model.addAttribute("noticeArguments", List.of(4));
        model.addAttribute(
                "picture",
                new Picture("<svg id=\"p\"></svg>", "How to read <it>", List.of("A"), List.of(List.of("<1>"))));
        return "sample/form";
    }

    @GetMapping({"/sample/refused", "/api/v1/sample/refused"})
    String refused() {
        List<RowError> rows = List.of(
                new RowError(41, "call", "may<be", "site.error.status", List.of("maybe")),
                new RowError(42, "", "", "site.pager.page", List.of(2)));
        throw new Refusal(Refusal.Kind.INVALID, "problem-not-known", List.of("rows & rims"), rows, 3);
    }

    @GetMapping("/api/v1/sample/kind")
    String kind(@RequestParam Refusal.Kind kind) {
        throw new Refusal(kind, "problem-not-known", "x");
    }

    @PostMapping("/api/v1/sample/body")
    @ResponseBody
    Body body(@Valid @RequestBody Body body) {
        return body;
    }

    @GetMapping({"/sample/broken", "/api/v1/sample/broken"})
    String broken() {
        throw new IllegalStateException("a secret of the inside");
    }
}
