package org.levelgaze.studies.sentences;

import java.util.Locale;
import org.levelgaze.agreement.Call;
import org.levelgaze.agreement.Engine;
import org.levelgaze.agreement.Findings;
import org.levelgaze.agreement.Study;
import org.levelgaze.agreement.StudyBuilder;
import org.levelgaze.agreement.Terms;
import org.levelgaze.agreement.TrueState;
import org.springframework.context.support.ResourceBundleMessageSource;

/** Ana on so many pieces, wrong so often, and the words of the bundles. */
record Tried(int defective, int good, int trials, int defectiveWrong, int goodWrong) {

    static Wording words(Locale locale) {
        ResourceBundleMessageSource messages = new ResourceBundleMessageSource();
        messages.setBasenames("messages/site", "messages/studies");
        messages.setDefaultEncoding("UTF-8");
        messages.setFallbackToSystemLocale(false);
        return new Wording(locale, (key, arguments) -> messages.getMessage(key, arguments, locale));
    }

    /** The first pieces of each state are called wrong, once, in the last trial. */
    Findings findings() {
        StudyBuilder study = Study.builder();
        study.appraiser("ANA");
        for (int piece = 0; piece < defective + good; piece++) {
            boolean isDefective = piece < defective;
            study.piece("P" + piece, isDefective ? TrueState.DEFECTIVE : TrueState.GOOD, null);
            boolean wrong = isDefective ? piece < defectiveWrong : piece - defective < goodWrong;
            for (int trial = 1; trial <= trials; trial++) {
                boolean rejects = isDefective != (wrong && trial == trials);
                study.call(piece, 0, trial, rejects ? Call.REJECT : Call.ACCEPT, Study.NO_KIND);
            }
        }
        return Engine.assess(study.build(), Terms.STANDARD);
    }

    InWords inWords() {
        return inWords(false, Locale.ENGLISH);
    }

    InWords inWords(boolean camera, Locale locale) {
        Findings found = findings();
        return AppraiserSentences.of(
                new Subject("Ana", camera, trials),
                found.appraisers().get(0),
                found.confidence(),
                UsualLimits.COMMON_PRACTICE,
                words(locale));
    }
}
