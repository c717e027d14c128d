package org.levelgaze.studies.pages;

import java.util.Locale;
import org.levelgaze.plot.Drawing;
import org.levelgaze.studies.sentences.Wording;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;

/** Gives sentences and pictures their words from the message bundles. */
@Component
class Languages {

    private final MessageSource messages;

    Languages(MessageSource messages) {
        this.messages = messages;
    }

    Wording wording(Locale locale) {
        return new Wording(locale, (key, arguments) -> messages.getMessage(key, arguments, locale));
    }

    /** Pictures on a page, whose ids begin with {@code id}. */
    Drawing drawing(String id, Locale locale) {
        return new Drawing(id, true, locale, (key, arguments) -> messages.getMessage(key, arguments, locale));
    }
}
