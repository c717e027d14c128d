package org.levelgaze.agreement;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/**
 * What one appraiser's calls show.
 *
 * @param appraiser his code
 * @param calls calls he made
 * @param effectiveness how often he is right
 * @param selfConsistency whether he agrees with himself; {@code null} when he made one trial or none
 * @param falseAccept accepts of defective pieces out of calls on defective pieces
 * @param falseReject rejects of good pieces out of calls on good pieces
 * @param biasRatio false reject / false accept
 * @param leanTest whether the two differ by more than chance
 * @param kappaToReference Cohen's kappa to the true state; first word of the table = his call, second = the true state
 * @param ac1ToReference Gwet's AC1 to the true state
 * @param mcnemar whether he errs one way more often than the other, by counts
 * @param signalDetection how well he tells the two apart, and where he draws the line
 * @param worthOfACall what his reject and his accept are worth, by the true defect rate of the flow ("0.01" is 1 %)
 * @param byDefectKind found and named, per true defect kind; {@code null} when the study knows no kinds
 */
public record AppraiserFindings(
        String appraiser,
        long calls,
        Effectiveness effectiveness,
        @Nullable SelfConsistency selfConsistency,
        Share falseAccept,
        Share falseReject,
        BiasRatio biasRatio,
        LeanTest leanTest,
        CohenKappa kappaToReference,
        GwetAC1 ac1ToReference,
        McNemar mcnemar,
        SignalDetection signalDetection,
        Map<String, WorthOfACall> worthOfACall,
        @Nullable List<DefectKindFindings> byDefectKind) {

    /** Keeps its own copies; the order of the defect rates stays. */
    public AppraiserFindings {
        worthOfACall = Collections.unmodifiableMap(new LinkedHashMap<>(worthOfACall));
        byDefectKind = byDefectKind == null ? null : List.copyOf(byDefectKind);
    }
}
