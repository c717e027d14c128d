package org.levelgaze.agreement;

import java.math.BigDecimal;
import java.util.LinkedHashMap;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/**
 * What a call is worth in a flow with a given true share of defective pieces: Bayes' rule with the uncorrected shares of
 * false accepts and false rejects (Altman &amp; Bland, BMJ 309 (1994) 102). A figure is {@code null} where nothing is
 * rejected, or accepted, or where there are no calls to tell from.
 *
 * @param rejectShare share of the flow that is rejected
 * @param ppvDefectiveGivenReject share of the rejected that is defective
 * @param npvGoodGivenAccept share of the accepted that is good
 * @param defectiveAmongAccepted share of the accepted that is defective
 * @param goodAmongRejected share of the rejected that is good
 */
public record WorthOfACall(
        @Nullable Double rejectShare,
        @Nullable Double ppvDefectiveGivenReject,
        @Nullable Double npvGoodGivenAccept,
        @Nullable Double defectiveAmongAccepted,
        @Nullable Double goodAmongRejected) {

    private static final double[] USUAL_RATES = {0.001, 0.01, 0.05};
    private static final String[] USUAL_NAMES = {"0.001", "0.01", "0.05"};

    /** At 0.1 %, 1 % and 5 % defective, and at the task's own rate when it has one. */
    static Map<String, WorthOfACall> table(Share falseAccept, Share falseReject, @Nullable Double ownRate) {
        Map<String, WorthOfACall> table = new LinkedHashMap<>();
        for (int at = 0; at < USUAL_RATES.length; at++) {
            table.put(USUAL_NAMES[at], at(USUAL_RATES[at], falseAccept.value(), falseReject.value()));
        }
        if (ownRate != null) {
            String name = BigDecimal.valueOf(ownRate).stripTrailingZeros().toPlainString();
            table.putIfAbsent(name, at(ownRate, falseAccept.value(), falseReject.value()));
        }
        return table;
    }

    static WorthOfACall at(double defectRate, @Nullable Double falseAccept, @Nullable Double falseReject) {
        if (falseAccept == null || falseReject == null) {
            return new WorthOfACall(null, null, null, null, null);
        }
        double caught = defectRate * (1 - falseAccept);
        double missed = defectRate * falseAccept;
        double heldBack = (1 - defectRate) * falseReject;
        double passed = (1 - defectRate) * (1 - falseReject);
        double rejected = caught + heldBack;
        double accepted = missed + passed;
        return new WorthOfACall(
                rejected,
                part(caught, rejected),
                part(passed, accepted),
                part(missed, accepted),
                part(heldBack, rejected));
    }

    private static @Nullable Double part(double part, double whole) {
        return whole == 0 ? null : part / whole;
    }
}
