package org.levelgaze.site;

import jakarta.servlet.http.HttpServletRequest;
import java.util.Locale;
import org.levelgaze.shared.Refusal;
import org.springframework.core.Ordered;
import org.springframework.core.annotation.Order;
import org.springframework.web.bind.annotation.ControllerAdvice;
import org.springframework.web.bind.annotation.ExceptionHandler;
import org.springframework.web.servlet.ModelAndView;

/** Answers a refusal: as problem details under {@code /api}, as a page elsewhere. */
@ControllerAdvice
@Order(Ordered.HIGHEST_PRECEDENCE)
class Refusals {

    private final Problems problems;
    private final ErrorPages pages;

    Refusals(Problems problems, ErrorPages pages) {
        this.problems = problems;
        this.pages = pages;
    }

    @ExceptionHandler
    Object refused(Refusal refusal, HttpServletRequest request, Locale locale) {
        if (ApiPaths.isApi(request)) {
            return problems.of(refusal, locale);
        }
        ModelAndView page = pages.page(Problems.status(refusal.kind()), request, locale);
        return page.addObject("refusal", refusal);
    }
}
