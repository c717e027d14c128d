package org.levelgaze.studies.sentences;

import java.util.ArrayList;
import java.util.List;

/** What a reader must know before any figure of a study. */
public final class StudyWarnings {

    private StudyWarnings() {}

    /** The warnings, the weightiest first; the last one holds for every study. */
    public static List<String> of(StudyFacts facts, UsualLimits limits, Wording words) {
        List<String> warnings = new ArrayList<>();
        if (facts.outOfDate()) {
            warnings.add(words.say(
                    "studies.warns.outOfDate",
                    facts.set(),
                    words.day(facts.performedOn()),
                    words.day(facts.decidedOn()),
                    words.day(facts.validUntil())));
        }
        if (facts.truthsFromImport()) {
            warnings.add(words.say("studies.warns.import", facts.set()));
        }
        balance(warnings, facts, limits, words);
        if (facts.pieces() < limits.minPieces()) {
            warnings.add(words.say("studies.warns.small", facts.pieces(), limits.minPieces()));
        }
        if (facts.trials() > limits.mostTrials()) {
            warnings.add(words.say("studies.warns.trials", facts.trials()));
        }
        if (facts.callsMissing() > 0) {
            warnings.add(words.say("studies.warns.missing", facts.callsMissing()));
        }
        if (facts.undecided() > 0) {
            warnings.add(words.say("studies.warns.undecided", facts.undecided()));
        }
        String share = words.percent((double) facts.defective() / Math.max(1, facts.pieces()), facts.pieces());
        warnings.add(words.say("studies.warns.prevalence", share));
        return warnings;
    }

    private static void balance(List<String> warnings, StudyFacts facts, UsualLimits limits, Wording words) {
        if (limits.balanced(facts.defective(), facts.pieces())) {
            return;
        }
        boolean fewDefective = facts.defective() < facts.good();
        int few = fewDefective ? facts.defective() : facts.good();
        String kind = fewDefective ? "defective" : "good";
        if (few == 0) {
            warnings.add(words.say("studies.warns.without." + kind));
        } else {
            warnings.add(
                    words.say("studies.warns.unbalanced." + kind, few, facts.pieces(), words.percent(1.0 / few, few)));
        }
    }
}
