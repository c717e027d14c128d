package org.levelgaze.site;

import java.text.MessageFormat;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.RowError;
import org.springframework.context.MessageSource;
import org.springframework.context.MessageSourceResolvable;
import org.springframework.stereotype.Component;

/** The sentences of refusals in the reader's language. */
@Component
class Sentences {

    private final MessageSource messages;

    Sentences(MessageSource messages) {
        this.messages = messages;
    }

    String sentence(Refusal refusal, Locale locale) {
        return sentence(refusal.messageKey(), refusal.arguments(), locale);
    }

    String sentence(RowError row, Locale locale) {
        return sentence(row.message(), row.arguments(), locale);
    }

    /** What a status means, as a heading. */
    String title(int status, Locale locale) {
        return sentence("site.error." + name(status, locale) + ".title", List.of(), locale);
    }

    /** The status when there are words for it, else {@code other}. */
    String name(int status, Locale locale) {
        boolean known = !"".equals(messages.getMessage("site.error." + status + ".title", null, "", locale));
        return known ? Integer.toString(status) : "other";
    }

    String sentence(MessageSourceResolvable resolvable, Locale locale) {
        return messages.getMessage(resolvable, locale);
    }

    String sentence(String key, List<?> arguments, Locale locale) {
        return messages.getMessage(key, arguments.toArray(), locale);
    }

    /** The sentence of a kind of problem with dots in place of what it names, if there is such a kind. */
    Optional<String> pattern(String type, Locale locale) {
        return Stream.of("refusal." + type, "site.problem." + type)
                .flatMap(key -> Optional.ofNullable(messages.getMessage(key, null, null, locale)).stream())
                .map(pattern -> pattern.indexOf('{') < 0 ? pattern : dotted(pattern, locale))
                .findFirst();
    }

    private static String dotted(String pattern, Locale locale) {
        MessageFormat format = new MessageFormat(pattern, locale);
        int places = format.getFormatsByArgumentIndex().length;
        for (int place = 0; place < places; place++) {
            format.setFormatByArgumentIndex(place, null);
        }
        return format.format(Collections.nCopies(places, "…").toArray());
    }
}
