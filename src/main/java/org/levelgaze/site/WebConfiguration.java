package org.levelgaze.site;

import java.util.Locale;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.web.servlet.LocaleResolver;
import org.springframework.web.servlet.config.annotation.InterceptorRegistry;
import org.springframework.web.servlet.config.annotation.WebMvcConfigurer;
import org.springframework.web.servlet.i18n.LocaleChangeInterceptor;

@Configuration(proxyBeanMethods = false)
class WebConfiguration implements WebMvcConfigurer {

    private static final String[] FILES = {"/css/**", "/js/**", "/fonts/**", "/icons/**", "/webjars/**"};

    private final ShellInterceptor shell;

    WebConfiguration(ShellInterceptor shell) {
        this.shell = shell;
    }

    @Bean
    static LocaleResolver localeResolver() {
        return new Languages();
    }

    @Override
    public void addInterceptors(InterceptorRegistry registry) {
        registry.addInterceptor(new OfferedLanguage()).excludePathPatterns(FILES);
        registry.addInterceptor(shell).excludePathPatterns(FILES);
    }

    /** Takes the parameter {@code lang} only for languages there are texts for. */
    private static final class OfferedLanguage extends LocaleChangeInterceptor {

        OfferedLanguage() {
            setParamName(Languages.PARAMETER);
        }

        @Override
        protected Locale parseLocaleValue(String value) {
            return Languages.closest(value);
        }
    }
}
