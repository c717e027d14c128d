package org.levelgaze.agreement;

import java.util.ArrayList;
import java.util.List;
import java.util.function.IntPredicate;
import java.util.stream.IntStream;
import org.apache.commons.statistics.distribution.BetaDistribution;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.RandomStudy.Row;

/**
 * A second implementation of the findings, slow and as close to the definitions as can be: it looks every call up by piece,
 * appraiser and trial, counts pairs one by one, differentiates numerically, and takes its distributions from another library.
 */
final class PlainFindings {

    private static final double LEVEL = 0.95;
    static final double Z = NormalDistribution.of(0, 1).inverseCumulativeProbability(1 - (1 - LEVEL) / 2);

    private final RandomStudy study;

    PlainFindings(RandomStudy study) {
        this.study = study;
    }

    int appraisers() {
        return study.appraisers().size();
    }

    @Nullable
    Row call(int piece, int appraiser, int trial) {
        return study.rows().stream()
                .filter(row -> row.piece() == piece && row.appraiser() == appraiser && row.trial() == trial)
                .findFirst()
                .orElse(null);
    }

    int trials(int appraiser) {
        return study.rows().stream()
                .filter(row -> row.appraiser() == appraiser)
                .mapToInt(Row::trial)
                .max()
                .orElse(0);
    }

    /** Rejects (true) and accepts (false) of one appraiser on one piece. */
    List<Boolean> calls(int piece, int appraiser) {
        List<Boolean> calls = new ArrayList<>();
        for (int trial = 1; trial <= trials(appraiser); trial++) {
            Row row = call(piece, appraiser, trial);
            if (row != null) {
                calls.add(row.call() == Call.REJECT);
            }
        }
        return calls;
    }

    List<Boolean> calls(int piece) {
        List<Boolean> calls = new ArrayList<>();
        for (int appraiser = 0; appraiser < appraisers(); appraiser++) {
            calls.addAll(calls(piece, appraiser));
        }
        return calls;
    }

    boolean defective(int piece) {
        return study.pieces().get(piece).truth() == TrueState.DEFECTIVE;
    }

    boolean complete(int piece, int appraiser) {
        return trials(appraiser) > 0 && calls(piece, appraiser).size() == trials(appraiser);
    }

    /** Everybody who judged at all judged it in each of his trials. */
    boolean complete(int piece) {
        return !study.rows().isEmpty()
                && IntStream.range(0, appraisers())
                        .filter(appraiser -> trials(appraiser) > 0)
                        .allMatch(appraiser -> complete(piece, appraiser));
    }

    boolean allRight(int piece, List<Boolean> calls) {
        return calls.stream().allMatch(reject -> reject == defective(piece));
    }

    static boolean allSame(List<Boolean> calls) {
        return calls.stream().distinct().count() <= 1;
    }

    long count(IntPredicate pieces) {
        return IntStream.range(0, study.pieces().size()).filter(pieces).count();
    }

    /** Calls of one appraiser: the rejects or accepts on defective or good pieces. */
    long count(int appraiser, boolean reject, boolean defective) {
        return study.rows().stream()
                .filter(row -> row.appraiser() == appraiser
                        && (row.call() == Call.REJECT) == reject
                        && defective(row.piece()) == defective)
                .count();
    }

    CallTable toReference(int appraiser) {
        return new CallTable(
                count(appraiser, true, true),
                count(appraiser, true, false),
                count(appraiser, false, true),
                count(appraiser, false, false));
    }

    CallTable pair(int first, int second) {
        long[][] counts = new long[2][2];
        for (Row one : study.rows()) {
            if (one.appraiser() == first) {
                Row other = call(one.piece(), second, one.trial());
                if (other != null) {
                    counts[one.call() == Call.REJECT ? 0 : 1][other.call() == Call.REJECT ? 0 : 1]++;
                }
            }
        }
        return new CallTable(counts[0][0], counts[0][1], counts[1][0], counts[1][1]);
    }

    long named(int appraiser, String kind, boolean right) {
        return study.rows().stream()
                .filter(row -> row.appraiser() == appraiser
                        && kind.equals(study.pieces().get(row.piece()).defectKind())
                        && row.call() == Call.REJECT
                        && (!right || kind.equals(row.seen())))
                .count();
    }

    long judged(int appraiser, String kind) {
        return study.rows().stream()
                .filter(row -> row.appraiser() == appraiser
                        && kind.equals(study.pieces().get(row.piece()).defectKind()))
                .count();
    }

    static Interval clopperPearson(long k, long n) {
        double tail = (1 - LEVEL) / 2;
        double lower = k == 0 ? 0 : BetaDistribution.of((double) k, n - k + 1.0).inverseCumulativeProbability(tail);
        double upper =
                k == n ? 1 : BetaDistribution.of(k + 1.0, (double) (n - k)).inverseSurvivalProbability(tail);
        return new Interval(lower, upper);
    }

    /** The two shares p with |k/n - p| = z sqrt(p (1 - p) / n), from the quadratic. */
    static Interval wilson(long k, long n) {
        double share = (double) k / n;
        double a = 1 + Z * Z / n;
        double b = -(2 * share + Z * Z / n);
        double root = Math.sqrt(Math.max(0, b * b - 4 * a * share * share));
        return new Interval((-b - root) / (2 * a), (-b + root) / (2 * a));
    }

    /** Kappa from the shares of the four cells. */
    static double kappa(double... p) {
        double observed = p[0] + p[3];
        double expected = (p[0] + p[1]) * (p[0] + p[2]) + (p[2] + p[3]) * (p[1] + p[3]);
        return (observed - expected) / (1 - expected);
    }

    static double[] cells(CallTable table) {
        double n = table.total();
        return new double[] {
            table.rejectReject() / n, table.rejectAccept() / n, table.acceptReject() / n, table.acceptAccept() / n
        };
    }

    static double[] independent(double... p) {
        double row = p[0] + p[1];
        double column = p[0] + p[2];
        return new double[] {row * column, row * (1 - column), (1 - row) * column, (1 - row) * (1 - column)};
    }

    /** The delta method with numerical derivatives: kappa's standard error where the cells have these shares. */
    static double standardError(double[] p, long n) {
        double step = 1e-5;
        double mean = 0;
        double square = 0;
        for (int cell = 0; cell < p.length; cell++) {
            double[] up = p.clone();
            double[] down = p.clone();
            up[cell] += step;
            down[cell] -= step;
            double slope = (kappa(up) - kappa(down)) / (2 * step);
            mean += p[cell] * slope;
            square += p[cell] * slope * slope;
        }
        return Math.sqrt(Math.max(0, square - mean * mean) / n);
    }

    /** Agreeing pairs of calls out of all ordered pairs on a piece. */
    static double agreeing(List<Boolean> calls) {
        long same = 0;
        for (int one = 0; one < calls.size(); one++) {
            for (int other = 0; other < calls.size(); other++) {
                same += one != other && calls.get(one).equals(calls.get(other)) ? 1 : 0;
            }
        }
        return (double) same / ((long) calls.size() * (calls.size() - 1));
    }

    static double rejects(List<Boolean> calls) {
        return calls.stream().filter(reject -> reject).count() / (double) calls.size();
    }

    static double fleiss(List<List<Boolean>> pieces) {
        double observed =
                pieces.stream().mapToDouble(PlainFindings::agreeing).average().orElseThrow();
        double p = pieces.stream().mapToDouble(PlainFindings::rejects).average().orElseThrow();
        double expected = p * p + (1 - p) * (1 - p);
        return (observed - expected) / (1 - expected);
    }

    static double ac1(List<List<Boolean>> pieces) {
        double observed = pieces.stream()
                .filter(calls -> calls.size() >= 2)
                .mapToDouble(PlainFindings::agreeing)
                .average()
                .orElseThrow();
        double p = pieces.stream()
                .filter(calls -> !calls.isEmpty())
                .mapToDouble(PlainFindings::rejects)
                .average()
                .orElseThrow();
        double expected = 2 * p * (1 - p);
        return (observed - expected) / (1 - expected);
    }

    /** The coincidence matrix, pair by pair. */
    static double alpha(List<List<Boolean>> pieces) {
        double[][] matrix = new double[2][2];
        for (List<Boolean> calls : pieces) {
            for (int one = 0; one < calls.size(); one++) {
                for (int other = 0; other < calls.size(); other++) {
                    if (one != other) {
                        matrix[calls.get(one) ? 1 : 0][calls.get(other) ? 1 : 0] += 1.0 / (calls.size() - 1);
                    }
                }
            }
        }
        double accepts = matrix[0][0] + matrix[0][1];
        double rejects = matrix[1][0] + matrix[1][1];
        double n = accepts + rejects;
        double observed = (matrix[0][1] + matrix[1][0]) / n;
        double expected = 2 * accepts * rejects / (n * (n - 1));
        return 1 - observed / expected;
    }
}
