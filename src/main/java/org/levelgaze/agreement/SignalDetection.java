package org.levelgaze.agreement;

import org.jspecify.annotations.Nullable;

/**
 * How well an appraiser tells defective from good (d'), and where he draws the line (c). The signal is a defective piece,
 * the response a reject. Both shares are corrected log-linearly, always: (x + 0.5) / (n + 1) (Macmillan &amp; Creelman,
 * Detection Theory; Hautus, Behav. Res. Methods 27 (1995) 46-51). Intervals by the variance of Gourevitch &amp; Galanter,
 * Psychometrika 32 (1967) 25-33, with the corrected shares and the plain counts.
 *
 * @param hits rejects of defective pieces
 * @param signalCalls calls on defective pieces
 * @param falseAlarms rejects of good pieces
 * @param noiseCalls calls on good pieces
 * @param hitRateCorrected share of hits, corrected; {@code null} without a call on a defective piece
 * @param falseAlarmRateCorrected share of false alarms, corrected; {@code null} without a call on a good piece
 * @param dPrime z(H) - z(F); {@code null} when undefined
 * @param dPrimeInterval its interval
 * @param criterionC -(z(H) + z(F)) / 2: above 0 leans lenient, below 0 strict; {@code null} when undefined
 * @param criterionCInterval its interval
 * @param undefined why there is no d' and no c, {@code null} when there are
 */
public record SignalDetection(
        long hits,
        long signalCalls,
        long falseAlarms,
        long noiseCalls,
        @Nullable Double hitRateCorrected,
        @Nullable Double falseAlarmRateCorrected,
        @Nullable Double dPrime,
        @Nullable Interval dPrimeInterval,
        @Nullable Double criterionC,
        @Nullable Interval criterionCInterval,
        @Nullable String undefined) {

    static SignalDetection of(long hits, long signalCalls, long falseAlarms, long noiseCalls, double z) {
        Double hitRate = corrected(hits, signalCalls);
        Double alarmRate = corrected(falseAlarms, noiseCalls);
        if (hitRate == null || alarmRate == null) {
            String reason = hitRate == null ? "no call on a defective piece" : "no call on a good piece";
            return new SignalDetection(
                    hits, signalCalls, falseAlarms, noiseCalls, hitRate, alarmRate, null, null, null, null, reason);
        }
        double spread = z * Math.sqrt(variance(hitRate, signalCalls) + variance(alarmRate, noiseCalls));
        double dPrime = dPrime(hitRate, alarmRate);
        double c = criterion(hitRate, alarmRate);
        return new SignalDetection(
                hits,
                signalCalls,
                falseAlarms,
                noiseCalls,
                hitRate,
                alarmRate,
                dPrime,
                Interval.around(dPrime, spread),
                c,
                Interval.around(c, spread / 2),
                null);
    }

    /** The lean that the interval of c shows. An appraiser without a mistake has none, whatever c is. */
    public Lean lean() {
        boolean flawless = hits == signalCalls && falseAlarms == 0;
        if (flawless || criterionCInterval == null || criterionCInterval.contains(0)) {
            return Lean.EVEN;
        }
        return criterionCInterval.lower() > 0 ? Lean.LENIENT : Lean.STRICT;
    }

    static double dPrime(double hitRate, double falseAlarmRate) {
        return Normal.quantile(hitRate) - Normal.quantile(falseAlarmRate);
    }

    static double criterion(double hitRate, double falseAlarmRate) {
        return -(Normal.quantile(hitRate) + Normal.quantile(falseAlarmRate)) / 2;
    }

    private static @Nullable Double corrected(long x, long n) {
        return n == 0 ? null : (x + 0.5) / (n + 1);
    }

    private static double variance(double p, long n) {
        double density = Normal.density(Normal.quantile(p));
        return p * (1 - p) / (n * density * density);
    }
}
