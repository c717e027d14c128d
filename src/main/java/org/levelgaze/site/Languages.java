package org.levelgaze.site;

import jakarta.servlet.http.HttpServletRequest;
import java.time.Duration;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.springframework.web.servlet.i18n.CookieLocaleResolver;

/** The languages there are texts for: the one chosen on a page, else the first the browser asks for, else English. */
final class Languages extends CookieLocaleResolver {

    /** The parameter that chooses a language. */
    static final String PARAMETER = "lang";

    /** The languages with complete message bundles. */
    static final List<Locale> OFFERED = List.of(Locale.ENGLISH, Locale.GERMAN);

    Languages() {
        super("language");
        setCookieMaxAge(Duration.ofDays(365));
        setCookieHttpOnly(true);
        setCookieSameSite("Lax");
        setDefaultLocaleFunction(Languages::asked);
    }

    /** The offered language that comes closest to a tag, English when none does. */
    static Locale closest(String tag) {
        Locale wanted = Locale.forLanguageTag(tag);
        return OFFERED.stream()
                .filter(offered -> offered.getLanguage().equals(wanted.getLanguage()))
                .findFirst()
                .orElse(Locale.ENGLISH);
    }

    @Override
    protected @Nullable Locale parseLocaleValue(String value) {
        return closest(value);
    }

    private static Locale asked(HttpServletRequest request) {
        return Collections.list(request.getLocales()).stream()
                .flatMap(wanted ->
                        OFFERED.stream().filter(offered -> offered.getLanguage().equals(wanted.getLanguage())))
                .findFirst()
                .orElse(Locale.ENGLISH);
    }
}
