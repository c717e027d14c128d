package org.levelgaze.site;

import jakarta.servlet.RequestDispatcher;
import jakarta.servlet.http.HttpServletRequest;
import java.util.Locale;
import java.util.Objects;
import org.springframework.boot.webmvc.error.ErrorController;
import org.springframework.http.HttpStatus;
import org.springframework.http.HttpStatusCode;
import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.servlet.ModelAndView;

/** What is answered when a request fails on its way: a page that names the thing and the way out, never a stack trace. */
@Controller
class ErrorPages implements ErrorController {

    private final Problems problems;
    private final Sentences words;

    ErrorPages(Problems problems, Sentences words) {
        this.problems = problems;
        this.words = words;
    }

    @RequestMapping("${server.error.path:/error}")
    Object failed(HttpServletRequest request, Locale locale) {
        HttpStatusCode status = status(request);
        return ApiPaths.isApi(request) ? problems.ofStatus(status, request, locale) : page(status, request, locale);
    }

    /** The page of a status; {@code refusal} may be added to its model. */
    ModelAndView page(HttpStatusCode status, HttpServletRequest request, Locale locale) {
        ModelAndView page = new ModelAndView("error");
        page.setStatus(status);
        page.addObject("status", status.value());
        page.addObject("words", words.name(status.value(), locale));
        page.addObject("path", ApiPaths.path(request));
        return page;
    }

    /** The status of the failed request; whoever opens the address of the error page itself finds nothing there. */
    private static HttpStatusCode status(HttpServletRequest request) {
        Object status = request.getAttribute(RequestDispatcher.ERROR_STATUS_CODE);
        return HttpStatusCode.valueOf((Integer) Objects.requireNonNullElse(status, HttpStatus.NOT_FOUND.value()));
    }
}
