package org.levelgaze.studies.sentences;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.AppraiserFindings;
import org.levelgaze.agreement.BiasRatio;
import org.levelgaze.agreement.CohenKappa;
import org.levelgaze.agreement.Interval;
import org.levelgaze.agreement.Lean;
import org.levelgaze.agreement.SelfConsistency;
import org.levelgaze.agreement.Share;

/** Writes what a study says of one appraiser: effective or not, which way the mistakes go, how sure, and what next. */
public final class AppraiserSentences {

    /** Agreement this high beside a kappa this low needs a word (common practice, no source). */
    private static final double HIGH_AGREEMENT = 0.85;

    private static final double LOW_KAPPA = 0.75;

    private final Subject who;
    private final AppraiserFindings found;
    private final double confidence;
    private final UsualLimits limits;
    private final Wording words;

    private AppraiserSentences(
            Subject who, AppraiserFindings found, double confidence, UsualLimits limits, Wording words) {
        this.who = who;
        this.found = found;
        this.confidence = confidence;
        this.limits = limits;
        this.words = words;
    }

    /**
     * Writes the sentences.
     *
     * @param who whom they speak of
     * @param found the findings
     * @param confidence the level of every interval
     * @param limits what the findings are held against
     * @param words the language
     */
    public static InWords of(
            Subject who, AppraiserFindings found, double confidence, UsualLimits limits, Wording words) {
        AppraiserSentences sentences = new AppraiserSentences(who, found, confidence, limits, words);
        LimitCheck check = LimitCheck.of(found, limits, words);
        boolean held = check.worst() != LimitCheck.Level.MISSED && sentences.whatIsMissing() == null;
        return new InWords(
                held,
                sentences.effective(check),
                sentences.lean(),
                sentences.ratio(),
                sentences.sure(),
                sentences.next(check),
                sentences.kappa());
    }

    private String effective(LimitCheck check) {
        Share right = right();
        String missing = whatIsMissing();
        if (missing != null && check.worst() != LimitCheck.Level.MISSED) {
            return words.say("studies.says.effective.open", who.name(), words.say("studies.says.without." + missing));
        }
        String key = "studies.says.effective." + check.worst().name().toLowerCase(Locale.ROOT);
        return words.say(
                key,
                who.name(),
                words.count(right.k()),
                words.count(right.n()),
                words.percentBeside(right, nearestLimit()),
                words.list(check.reasons()));
    }

    private double nearestLimit() {
        Double value = right().value();
        return value != null && value < limits.minEffectiveness()
                ? limits.minEffectiveness()
                : limits.remarkBelowEffectiveness();
    }

    /** What keeps this study from saying anything; null: nothing does. */
    private @Nullable String whatIsMissing() {
        if (found.falseAccept().n() == 0) {
            return "defective";
        }
        if (found.falseReject().n() == 0) {
            return "good";
        }
        return right().n() == 0 ? "complete" : null;
    }

    private String lean() {
        Share accepts = found.falseAccept();
        Share rejects = found.falseReject();
        if (accepts.n() == 0 || rejects.n() == 0) {
            return words.say("studies.says.lean.open", who.name());
        }
        if (accepts.k() == 0 && rejects.k() == 0) {
            return words.say("studies.says.lean.none", who.name());
        }
        String key =
                "studies.says.lean." + found.signalDetection().lean().name().toLowerCase(Locale.ROOT);
        return words.say(key, who.name(), words.percent(accepts), words.percent(rejects));
    }

    private String ratio() {
        BiasRatio ratio = found.biasRatio();
        Interval interval = ratio.interval();
        if (interval == null) {
            return "";
        }
        String range = words.range(interval);
        if (interval.contains(1)) {
            return ratio.ofRates() == null
                    ? words.say("studies.says.ratio.even.infinite", range)
                    : words.say("studies.says.ratio.even", words.number(ratio.ofRates()), range);
        }
        String apart = ratio.ofRates() == null
                ? words.say("studies.says.ratio.apart.infinite", range)
                : words.say("studies.says.ratio.apart", words.number(ratio.ofRates()), range);
        return found.signalDetection().lean() == Lean.EVEN
                ? apart + " " + words.say("studies.says.ratio.apart.open")
                : apart;
    }

    private String sure() {
        Share right = right();
        if (right.n() == 0) {
            return words.say("studies.says.sure.open");
        }
        Interval interval = right.clopperPearson();
        String size = words.say(
                "studies.says.sure",
                words.count(right.n()),
                words.percent(right),
                words.range(interval, right.n()),
                words.limit(confidence));
        String limit = words.limit(limits.minEffectiveness());
        if (interval.contains(limits.minEffectiveness())) {
            return size + " " + words.say("studies.says.sure.inside", limit);
        }
        boolean above = interval.lower() > limits.minEffectiveness();
        return size + " " + words.say(above ? "studies.says.sure.above" : "studies.says.sure.below", limit);
    }

    private List<String> next(LimitCheck check) {
        List<String> next = new ArrayList<>();
        String missing = whatIsMissing();
        if (missing != null) {
            next.add(words.say("studies.says.next.without." + missing));
        }
        Double ratio = found.biasRatio().ofRates();
        if (ratio != null && ratio < limits.minBiasRatio()) {
            next.add(words.say("studies.says.next.refresh", who.name(), words.number(ratio)));
        }
        if (check.worst() == LimitCheck.Level.MISSED) {
            next.add(words.say("studies.says.next.look", who.name()));
        }
        if (right().clopperPearson().contains(limits.minEffectiveness())) {
            morePieces(next);
        }
        next.addAll(repeats());
        return next.isEmpty() ? List.of(words.say("studies.says.next.nothing")) : next;
    }

    private void morePieces(List<String> next) {
        String limit = words.limit(limits.minEffectiveness());
        PiecesToSettle.of(right(), limits.minEffectiveness(), confidence)
                .ifPresent(pieces -> next.add(words.say("studies.says.next.more", words.count(pieces), limit)));
    }

    private List<String> repeats() {
        String kind = who.isCamera() ? "camera" : "person";
        SelfConsistency self = found.selfConsistency();
        if (self == null) {
            return List.of(words.say("studies.says.next.repeat." + kind, who.name()));
        }
        Share same = self.samePiece();
        return who.isCamera() && same.k() < same.n()
                ? List.of(words.say(
                        "studies.says.next.unsteady",
                        who.name(),
                        words.count(same.n() - same.k()),
                        words.count(same.n())))
                : List.of();
    }

    private @Nullable String kappa() {
        CohenKappa kappa = found.kappaToReference();
        Double value = kappa.kappa();
        Double observed = kappa.observedAgreement();
        if (value == null || observed == null || value >= LOW_KAPPA || observed < HIGH_AGREEMENT) {
            return null;
        }
        return words.say(
                "studies.says.kappa",
                who.name(),
                words.number(value),
                words.percent(observed, kappa.n()),
                words.percent(kappa.expectedAgreement(), kappa.n()));
    }

    private Share right() {
        return found.effectiveness().byPiece();
    }
}
