package org.levelgaze.studies.importing;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.levelgaze.register.AppraiserKind;
import org.levelgaze.studies.Consent;
import org.levelgaze.studies.ImportOutcome;
import org.springframework.validation.Errors;

/** Checks the answers to the questions of a run: nothing new is entered without a yes. */
final class QuestionCheck {

    private static final Map<String, AppraiserKind> KINDS =
            Map.of(QuestionForm.PERSON, AppraiserKind.PERSON, QuestionForm.CAMERA, AppraiserKind.CAMERA);

    private QuestionCheck() {}

    /** The consent that the answers add to the one given before; none when a question is open. */
    static Optional<Consent> consent(ImportOutcome.Asked asked, QuestionForm form, Consent before, Errors errors) {
        Map<String, AppraiserKind> appraisers = new HashMap<>(before.newAppraisers());
        List<String> words = asked.unknownAppraisers();
        for (int at = 0; at < words.size(); at++) {
            AppraiserKind kind = KINDS.get(form.appraisers().get(at).kind());
            if (kind == null) {
                errors.rejectValue(
                        "appraisers[" + at + "].kind", "studies.import.fault.who", new Object[] {words.get(at)}, null);
            } else {
                appraisers.put(words.get(at), kind);
            }
        }
        boolean newSet = said(asked.unknownSet(), form.newSet(), "newSet", errors);
        boolean newKinds = said(!asked.unknownKinds().isEmpty(), form.newKinds(), "newKinds", errors);
        boolean repeat = said(asked.duplicateOf() != null, form.repeat(), "repeat", errors);
        return errors.hasErrors()
                ? Optional.empty()
                : Optional.of(new Consent(
                        before.newSet() || newSet,
                        before.newKinds() || newKinds,
                        false,
                        appraisers,
                        before.repeat() || repeat));
    }

    private static boolean said(boolean asked, String answer, String field, Errors errors) {
        boolean yes = answer.equals(QuestionForm.YES);
        if (asked && !yes) {
            errors.rejectValue(field, "studies.import.fault." + field);
        }
        return asked && yes;
    }
}
