package org.levelgaze.agreement;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * The work of {@link Engine} by its own code, without the intervals of Clopper and Pearson, of Wilson, of Koopman, and of d'
 * and c. What it finds is built and kept as the engine does.
 */
final class WithoutIntervals {

    /** A share without its intervals. */
    private record Point(long k, long n, @Nullable Double value) {

        static Point of(long k, long n) {
            return new Point(k, n, n == 0 ? null : (double) k / n);
        }
    }

    private final Study study;
    private final double z;
    private final boolean countsAndKappasOnly;
    private final List<@Nullable Object> found = new ArrayList<>();

    private WithoutIntervals(Study study, double z, boolean countsAndKappasOnly) {
        this.study = study;
        this.z = z;
        this.countsAndKappasOnly = countsAndKappasOnly;
    }

    /** Counts and coefficients of agreement, and nothing else. */
    static List<@Nullable Object> countsAndKappas(Study study) {
        return new WithoutIntervals(study, Normal.twoSided(0.95), true).findings();
    }

    /** Everything that the engine finds: also the two tests, d' and c, and the worth of a call. */
    static List<@Nullable Object> all(Study study) {
        return new WithoutIntervals(study, Normal.twoSided(0.95), false).findings();
    }

    private List<@Nullable Object> findings() {
        int count = study.appraisers().size();
        PieceTotals totals = new PieceTotals(study);
        for (int appraiser = 0; appraiser < count; appraiser++) {
            Tally tally = new Tally(study, appraiser);
            tally.count(totals);
            appraiser(appraiser, tally);
        }
        found.add(StudyShape.of(study));
        together(totals, count);
        return found;
    }

    private void appraiser(int appraiser, Tally tally) {
        found.add(Point.of(tally.completeRight(), tally.completePieces()));
        found.add(Point.of(tally.judgedRight(), tally.judgedPieces()));
        found.add(Point.of(tally.rightCalls(), tally.calls()));
        found.add(Point.of(tally.completeSame(), tally.completePieces()));
        found.add(Point.of(tally.repeatedSame(), tally.repeatedPieces()));
        found.add(tally.fleiss());
        found.add(tally.alpha());
        found.add(tally.ac1());
        found.add(CohenKappa.of(tally.table(), z));
        found.add(GwetAC1.toReference(tally.table()));
        Point falseAccept = Point.of(tally.missed(), tally.defectiveCalls());
        Point falseReject = Point.of(tally.falseRejects(), tally.goodCalls());
        found.add(falseAccept);
        found.add(falseReject);
        if (!countsAndKappasOnly) {
            testsAndRates(appraiser, tally, falseAccept, falseReject);
        }
    }

    private void testsAndRates(int appraiser, Tally tally, Point falseAccept, Point falseReject) {
        found.add(LeanTest.of(tally.missed(), tally.defectiveCalls(), tally.falseRejects(), tally.goodCalls()));
        found.add(McNemar.of(tally.missed(), tally.falseRejects()));
        double hits = corrected(tally.hits(), tally.defectiveCalls());
        double alarms = corrected(tally.falseRejects(), tally.goodCalls());
        found.add(SignalDetection.dPrime(hits, alarms));
        found.add(SignalDetection.criterion(hits, alarms));
        for (double rate : new double[] {0.001, 0.01, 0.05}) {
            found.add(WorthOfACall.at(rate, falseAccept.value(), falseReject.value()));
        }
        found.add(KindTally.of(study, appraiser, 0.95));
    }

    private static double corrected(long x, long n) {
        return (x + 0.5) / (n + 1);
    }

    private void together(PieceTotals totals, int count) {
        totals.close();
        found.add(Point.of(totals.right(), totals.complete()));
        found.add(Point.of(totals.same(), totals.complete()));
        found.add(totals.fleiss());
        found.add(totals.alpha());
        found.add(totals.ac1());
        for (int first = 0; first < count; first++) {
            for (int second = first + 1; second < count; second++) {
                found.add(CohenKappa.of(PairTable.of(study, first, second), z));
            }
        }
    }
}
