package org.levelgaze.agreement;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/** Computes the findings of a study: one pass over the calls of each appraiser and one over each pair. */
public final class Engine {

    /** Stored beside findings; changes whenever a figure may change. */
    public static final String VERSION = "1";

    private final Study study;
    private final Terms terms;
    private final double z;

    private Engine(Study study, Terms terms) {
        this.study = study;
        this.terms = terms;
        this.z = Normal.twoSided(terms.confidence());
    }

    /**
     * What the calls of the study show. Time and memory grow with the number of calls, and with the number of pairs of
     * appraisers.
     */
    public static Findings assess(Study study, Terms terms) {
        return new Engine(study, terms).findings();
    }

    private Findings findings() {
        int count = study.appraisers().size();
        PieceTotals totals = new PieceTotals(study);
        List<AppraiserFindings> appraisers = new ArrayList<>(count);
        for (int appraiser = 0; appraiser < count; appraiser++) {
            Tally tally = new Tally(study, appraiser);
            tally.count(totals);
            appraisers.add(appraiser(appraiser, tally));
        }
        return new Findings(terms.confidence(), StudyShape.of(study), appraisers, together(totals, count));
    }

    private AppraiserFindings appraiser(int appraiser, Tally tally) {
        Share falseAccept = share(tally.missed(), tally.defectiveCalls());
        Share falseReject = share(tally.falseRejects(), tally.goodCalls());
        CallTable table = tally.table();
        Map<String, WorthOfACall> worth = WorthOfACall.table(falseAccept, falseReject, terms.defectRate());
        return new AppraiserFindings(
                study.appraisers().get(appraiser),
                tally.calls(),
                effectiveness(tally),
                selfConsistency(tally),
                falseAccept,
                falseReject,
                BiasRatio.of(falseReject, falseAccept, terms.confidence()),
                LeanTest.of(tally.missed(), tally.defectiveCalls(), tally.falseRejects(), tally.goodCalls()),
                CohenKappa.of(table, z),
                GwetAC1.toReference(table),
                McNemar.of(tally.missed(), tally.falseRejects()),
                SignalDetection.of(tally.hits(), tally.defectiveCalls(), tally.falseRejects(), tally.goodCalls(), z),
                worth,
                KindTally.of(study, appraiser, terms.confidence()));
    }

    private Effectiveness effectiveness(Tally tally) {
        return new Effectiveness(
                share(tally.completeRight(), tally.completePieces()),
                share(tally.judgedRight(), tally.judgedPieces()),
                share(tally.rightCalls(), tally.calls()));
    }

    private @Nullable SelfConsistency selfConsistency(Tally tally) {
        if (tally.trials() < 2) {
            return null;
        }
        return new SelfConsistency(
                share(tally.completeSame(), tally.completePieces()),
                share(tally.repeatedSame(), tally.repeatedPieces()),
                tally.fleiss(),
                tally.alpha(),
                tally.ac1());
    }

    private TogetherFindings together(PieceTotals totals, int count) {
        totals.close();
        Share allRight = share(totals.right(), totals.complete());
        Share allSame = totals.callsPerPiece() < 2 ? null : share(totals.same(), totals.complete());
        if (count < 2) {
            return new TogetherFindings(allRight, allSame, null, null, null, List.of());
        }
        return new TogetherFindings(allRight, allSame, totals.fleiss(), totals.alpha(), totals.ac1(), pairs(count));
    }

    private List<AppraiserPair> pairs(int count) {
        List<AppraiserPair> pairs = new ArrayList<>(count * (count - 1) / 2);
        for (int first = 0; first < count; first++) {
            for (int second = first + 1; second < count; second++) {
                CohenKappa kappa = CohenKappa.of(PairTable.of(study, first, second), z);
                pairs.add(new AppraiserPair(
                        study.appraisers().get(first), study.appraisers().get(second), kappa));
            }
        }
        return pairs;
    }

    private Share share(long k, long n) {
        return Share.of(k, n, terms.confidence());
    }
}
