package org.levelgaze.studies.sentences;

import java.util.ArrayList;
import java.util.List;
import org.levelgaze.agreement.AppraiserFindings;
import org.levelgaze.agreement.Share;

/** Findings held against limits: the three bands can disagree, so each is named and the worst decides. */
final class LimitCheck {

    /** How far a limit was held; the later, the worse. */
    enum Level {
        HELD,
        REMARK,
        MISSED
    }

    private final UsualLimits limits;
    private final Wording words;
    private final List<String> reasons = new ArrayList<>();
    private Level worst = Level.HELD;

    private LimitCheck(UsualLimits limits, Wording words) {
        this.limits = limits;
        this.words = words;
    }

    static LimitCheck of(AppraiserFindings found, UsualLimits limits, Wording words) {
        LimitCheck check = new LimitCheck(limits, words);
        check.effectiveness(found.effectiveness().byPiece());
        check.atMost("falseAccept", found.falseAccept(), limits.maxFalseAccept(), limits.remarkAboveFalseAccept());
        check.atMost("falseReject", found.falseReject(), limits.maxFalseReject(), limits.remarkAboveFalseReject());
        return check;
    }

    /** The worst of the three. */
    Level worst() {
        return worst;
    }

    /** Every limit that was not held, in words. */
    List<String> reasons() {
        return List.copyOf(reasons);
    }

    private void effectiveness(Share share) {
        Double value = share.value();
        if (value == null || value >= limits.remarkBelowEffectiveness()) {
            return;
        }
        boolean missed = value < limits.minEffectiveness();
        double limit = missed ? limits.minEffectiveness() : limits.remarkBelowEffectiveness();
        note(missed, "effectiveness", words.limit(limit));
    }

    private void atMost(String name, Share share, double most, double remarkAbove) {
        Double value = share.value();
        if (value == null || value <= remarkAbove) {
            return;
        }
        boolean missed = value > most;
        double limit = missed ? most : remarkAbove;
        note(
                missed,
                name,
                words.count(share.k()),
                words.count(share.n()),
                words.percentBeside(share, limit),
                words.limit(limit));
    }

    private void note(boolean missed, String name, Object... arguments) {
        Level level = missed ? Level.MISSED : Level.REMARK;
        worst = level.compareTo(worst) > 0 ? level : worst;
        reasons.add(words.say("studies.says." + name + (missed ? ".missed" : ".remark"), arguments));
    }
}
