package org.levelgaze.site;

import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;

import java.util.Locale;
import org.springframework.format.support.FormattingConversionService;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import org.springframework.test.web.servlet.setup.MockMvcBuilders;
import org.springframework.web.context.WebApplicationContext;
import org.springframework.web.servlet.LocaleResolver;
import org.springframework.web.servlet.ViewResolver;

/** The sample pages inside of the program's own shell, without its sign-in. */
final class SamplePages {

    private SamplePages() {}

    static MockMvcTester of(WebApplicationContext context) {
        // A lambda around it, since the resolver itself must not be given another application context
        ViewResolver views = context.getBean("thymeleafViewResolver", ViewResolver.class);
        return MockMvcTester.create(MockMvcBuilders.standaloneSetup(new SampleController())
                .setControllerAdvice(context.getBean(Refusals.class), context.getBean(ApiProblems.class))
                .setViewResolvers((name, locale) -> views.resolveViewName(name, locale))
                .setLocaleResolver(context.getBean(LocaleResolver.class))
                .setConversionService(context.getBean("mvcConversionService", FormattingConversionService.class))
                .addInterceptors(context.getBean(ShellInterceptor.class))
                .defaultRequest(get("/").locale(Locale.ENGLISH))
                .build());
    }
}
