package org.levelgaze.agreement;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.stream.IntStream;
import java.util.stream.LongStream;
import org.apache.commons.statistics.distribution.BinomialDistribution;
import org.apache.commons.statistics.distribution.HypergeometricDistribution;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The engine against a second, plain implementation over random studies; the seed is the parameter. */
class SecondImplementationTest {

    private static final double TOLERANCE = 1e-9;
    /** The plain implementation differentiates numerically, and a standard error is a root. */
    private static final double TOLERANCE_OF_SLOPES = 1e-6;

    static LongStream seeds() {
        return LongStream.range(0, 400);
    }

    @ParameterizedTest(name = "seed {0}")
    @MethodSource("seeds")
    void agreesWithThePlainImplementation(long seed) {
        RandomStudy study = RandomStudy.of(seed);
        PlainFindings plain = new PlainFindings(study);
        Findings findings = study.findings();

        assertThat(findings.appraisers()).hasSize(plain.appraisers());
        for (int appraiser = 0; appraiser < plain.appraisers(); appraiser++) {
            AppraiserFindings one = findings.appraisers().get(appraiser);
            checkRight(one, appraiser, plain);
            checkSelf(one, appraiser, plain);
            checkMistakes(one, appraiser, plain);
            checkKinds(study, one, appraiser, plain);
            checkKappa(one.kappaToReference(), plain.toReference(appraiser));
        }
        checkTogether(study, findings.together(), plain);
        checkShape(study, findings.study(), plain);
    }

    private static void checkRight(AppraiserFindings one, int appraiser, PlainFindings plain) {
        long complete = plain.count(piece -> plain.complete(piece, appraiser));
        check(
                one.effectiveness().byPiece(),
                plain.count(piece ->
                        plain.complete(piece, appraiser) && plain.allRight(piece, plain.calls(piece, appraiser))),
                complete);
        check(
                one.effectiveness().byPieceAnyCalls(),
                plain.count(piece -> !plain.calls(piece, appraiser).isEmpty()
                        && plain.allRight(piece, plain.calls(piece, appraiser))),
                plain.count(piece -> !plain.calls(piece, appraiser).isEmpty()));
        CallTable table = plain.toReference(appraiser);
        check(one.effectiveness().byCall(), table.rejectReject() + table.acceptAccept(), table.total());
        assertThat(one.calls()).isEqualTo(table.total());
    }

    private static void checkSelf(AppraiserFindings one, int appraiser, PlainFindings plain) {
        SelfConsistency self = one.selfConsistency();
        if (plain.trials(appraiser) <= 1) {
            assertThat(self).isNull();
            return;
        }
        Objects.requireNonNull(self);
        check(
                self.samePiece(),
                plain.count(piece ->
                        plain.complete(piece, appraiser) && PlainFindings.allSame(plain.calls(piece, appraiser))),
                plain.count(piece -> plain.complete(piece, appraiser)));
        check(
                self.samePieceAnyCalls(),
                plain.count(piece -> plain.calls(piece, appraiser).size() >= 2
                        && PlainFindings.allSame(plain.calls(piece, appraiser))),
                plain.count(piece -> plain.calls(piece, appraiser).size() >= 2));
        List<List<Boolean>> complete = new ArrayList<>();
        List<List<Boolean>> any = new ArrayList<>();
        plain.count(piece -> any.add(plain.calls(piece, appraiser)));
        plain.count(piece -> plain.complete(piece, appraiser) && complete.add(plain.calls(piece, appraiser)));
        checkFleiss(self.fleiss(), complete, plain.trials(appraiser));
        checkMany(self.krippendorffAlpha(), self.gwetAC1(), any);
    }

    private static void checkMistakes(AppraiserFindings one, int appraiser, PlainFindings plain) {
        CallTable table = plain.toReference(appraiser);
        long missed = table.acceptReject();
        long alarms = table.rejectAccept();
        long signals = missed + table.rejectReject();
        long noise = alarms + table.acceptAccept();
        check(one.falseAccept(), missed, signals);
        check(one.falseReject(), alarms, noise);
        assertThat(one.mcnemar().falseAccept()).isEqualTo(missed);
        assertThat(one.mcnemar().falseReject()).isEqualTo(alarms);
        double tail = BinomialDistribution.of((int) (missed + alarms), 0.5)
                .cumulativeProbability((int) Math.min(missed, alarms));
        double expected = Math.min(1, 2 * tail);
        assertThat(one.mcnemar().pTwoSided()).isCloseTo(expected, within(TOLERANCE));
        checkLeanTest(one, missed, signals, alarms, noise);
        checkDetection(one.signalDetection(), signals - missed, signals, alarms, noise);
        checkWorth(one, missed, signals, alarms, noise);
    }

    private static void checkLeanTest(AppraiserFindings one, long missed, long signals, long alarms, long noise) {
        if (signals == 0 || noise == 0 || missed + alarms == 0 || missed + alarms == signals + noise) {
            assertThat(one.leanTest().pTwoSided()).isEqualTo(1);
            return;
        }
        HypergeometricDistribution tables =
                HypergeometricDistribution.of((int) (signals + noise), (int) signals, (int) (missed + alarms));
        double limit = tables.probability((int) missed) * (1 + 1e-7);
        double expected = 0;
        for (int x = tables.getSupportLowerBound(); x <= tables.getSupportUpperBound(); x++) {
            expected += tables.probability(x) <= limit ? tables.probability(x) : 0;
        }
        close(one.leanTest().pTwoSided(), expected);
    }

    private static void checkDetection(SignalDetection one, long hits, long signals, long alarms, long noise) {
        assertThat(List.of(one.hits(), one.signalCalls(), one.falseAlarms(), one.noiseCalls()))
                .containsExactly(hits, signals, alarms, noise);
        if (signals == 0 || noise == 0) {
            assertThat(one.undefined()).isNotBlank();
            assertThat(one.dPrime()).isNull();
            assertThat(one.criterionC()).isNull();
            return;
        }
        NormalDistribution normal = NormalDistribution.of(0, 1);
        double h = (hits + 0.5) / (signals + 1);
        double f = (alarms + 0.5) / (noise + 1);
        double zh = normal.inverseCumulativeProbability(h);
        double zf = normal.inverseCumulativeProbability(f);
        double spread = PlainFindings.Z
                * Math.sqrt(h * (1 - h) / signals / Math.pow(normal.density(zh), 2)
                        + f * (1 - f) / noise / Math.pow(normal.density(zf), 2));
        close(one.dPrime(), zh - zf);
        close(one.criterionC(), -(zh + zf) / 2);
        close(Objects.requireNonNull(one.dPrimeInterval()).upper(), zh - zf + spread);
        close(Objects.requireNonNull(one.criterionCInterval()).lower(), -(zh + zf) / 2 - spread / 2);
    }

    /** Counts in an imagined flow of a million pieces. */
    private static void checkWorth(AppraiserFindings one, long missed, long signals, long alarms, long noise) {
        assertThat(one.worthOfACall().keySet()).containsExactly("0.001", "0.01", "0.05");
        one.worthOfACall().forEach((rate, worth) -> {
            if (signals == 0 || noise == 0) {
                assertThat(worth).isEqualTo(new WorthOfACall(null, null, null, null, null));
                return;
            }
            double bad = 1e6 * Double.parseDouble(rate);
            double good = 1e6 - bad;
            double letOut = bad * missed / signals;
            double keptBack = good * alarms / noise;
            double rejected = bad - letOut + keptBack;
            double accepted = 1e6 - rejected;
            close(worth.rejectShare(), rejected / 1e6);
            if (rejected == 0) {
                assertThat(worth.ppvDefectiveGivenReject()).isNull();
                assertThat(worth.goodAmongRejected()).isNull();
            } else {
                close(worth.ppvDefectiveGivenReject(), (bad - letOut) / rejected);
                close(worth.goodAmongRejected(), keptBack / rejected);
            }
            if (missed == signals || alarms < noise) {
                close(worth.npvGoodGivenAccept(), (good - keptBack) / accepted);
                close(worth.defectiveAmongAccepted(), letOut / accepted);
            }
        });
    }

    private static void checkKinds(RandomStudy study, AppraiserFindings one, int appraiser, PlainFindings plain) {
        List<String> kinds = study.pieces().stream()
                .map(Piece::defectKind)
                .filter(Objects::nonNull)
                .distinct()
                .toList();
        if (kinds.isEmpty()) {
            assertThat(one.byDefectKind()).isNull();
            return;
        }
        boolean anySeen = study.rows().stream().anyMatch(row -> row.seen() != null);
        List<DefectKindFindings> found = Objects.requireNonNull(one.byDefectKind());
        assertThat(found).extracting(DefectKindFindings::kind).containsExactlyElementsOf(kinds);
        for (DefectKindFindings kind : found) {
            long detected = plain.named(appraiser, kind.kind(), false);
            check(kind.detected(), detected, plain.judged(appraiser, kind.kind()));
            check(kind.named(), plain.named(appraiser, kind.kind(), true), anySeen ? detected : 0);
        }
    }

    private static void checkTogether(RandomStudy study, TogetherFindings together, PlainFindings plain) {
        long complete = plain.count(plain::complete);
        check(
                together.allRight(),
                plain.count(piece -> plain.complete(piece) && plain.allRight(piece, plain.calls(piece))),
                complete);
        int callsPerPiece =
                IntStream.range(0, plain.appraisers()).map(plain::trials).sum();
        if (callsPerPiece < 2) {
            assertThat(together.allSame()).isNull();
        } else {
            check(
                    Objects.requireNonNull(together.allSame()),
                    plain.count(piece -> plain.complete(piece) && PlainFindings.allSame(plain.calls(piece))),
                    complete);
        }
        if (plain.appraisers() == 1) {
            assertThat(together.fleiss()).isNull();
            assertThat(together.krippendorffAlpha()).isNull();
            assertThat(together.gwetAC1()).isNull();
            assertThat(together.pairs()).isEmpty();
            return;
        }
        List<List<Boolean>> all =
                IntStream.range(0, study.pieces().size()).mapToObj(plain::calls).toList();
        List<List<Boolean>> whole = all.stream()
                .filter(calls -> !calls.isEmpty() && calls.size() == callsPerPiece)
                .toList();
        checkFleiss(Objects.requireNonNull(together.fleiss()), whole, callsPerPiece);
        checkMany(
                Objects.requireNonNull(together.krippendorffAlpha()), Objects.requireNonNull(together.gwetAC1()), all);
        checkPairs(study, together, plain);
    }

    private static void checkPairs(RandomStudy study, TogetherFindings together, PlainFindings plain) {
        int at = 0;
        for (int first = 0; first < plain.appraisers(); first++) {
            for (int second = first + 1; second < plain.appraisers(); second++) {
                AppraiserPair pair = together.pairs().get(at++);
                assertThat(pair.first()).isEqualTo(study.appraisers().get(first));
                assertThat(pair.second()).isEqualTo(study.appraisers().get(second));
                checkKappa(pair.kappa(), plain.pair(first, second));
            }
        }
        assertThat(together.pairs()).hasSize(at);
    }

    private static void checkShape(RandomStudy study, StudyShape shape, PlainFindings plain) {
        long planned = (long) study.pieces().size()
                * IntStream.range(0, plain.appraisers()).map(plain::trials).sum();
        int most =
                IntStream.range(0, plain.appraisers()).map(plain::trials).max().orElseThrow();
        int defective = (int) plain.count(plain::defective);
        assertThat(shape)
                .isEqualTo(new StudyShape(
                        study.pieces().size(),
                        defective,
                        study.pieces().size() - defective,
                        plain.appraisers(),
                        most,
                        planned,
                        study.rows().size()));
    }

    private static void checkKappa(CohenKappa kappa, CallTable table) {
        assertThat(kappa.table()).isEqualTo(table);
        assertThat(kappa.n()).isEqualTo(table.total());
        double[] cells = PlainFindings.cells(table);
        boolean defined =
                table.total() > 0 && table.rejectReject() < table.total() && table.acceptAccept() < table.total();
        if (!defined) {
            assertThat(kappa.kappa()).isNull();
            assertThat(kappa.interval()).isNull();
            assertThat(kappa.undefined()).isNotBlank();
            return;
        }
        assertThat(kappa.undefined()).isNull();
        close(kappa.kappa(), PlainFindings.kappa(cells));
        close(kappa.observedAgreement(), cells[0] + cells[3]);
        double se = PlainFindings.standardError(cells, table.total());
        assertThat(kappa.se()).isCloseTo(se, within(TOLERANCE_OF_SLOPES));
        assertThat(kappa.seH0())
                .isCloseTo(
                        PlainFindings.standardError(PlainFindings.independent(cells), table.total()),
                        within(TOLERANCE_OF_SLOPES));
        assertThat(Objects.requireNonNull(kappa.interval()).upper())
                .isCloseTo(PlainFindings.kappa(cells) + PlainFindings.Z * se, within(10 * TOLERANCE_OF_SLOPES));
    }

    private static void checkFleiss(FleissKappa fleiss, List<List<Boolean>> pieces, int raters) {
        assertThat(fleiss.pieces()).isEqualTo(pieces.size());
        assertThat(fleiss.ratersPerPiece()).isEqualTo(raters);
        if (raters < 2 || pieces.isEmpty() || oneSided(pieces)) {
            assertThat(fleiss.kappa()).isNull();
            assertThat(fleiss.seH0()).isNull();
            assertThat(fleiss.undefined()).isNotBlank();
        } else {
            close(fleiss.kappa(), PlainFindings.fleiss(pieces));
            close(fleiss.seH0(), Math.sqrt(2.0 / (pieces.size() * (double) raters * (raters - 1))));
        }
    }

    private static void checkMany(KrippendorffAlpha alpha, GwetAC1 ac1, List<List<Boolean>> pieces) {
        List<List<Boolean>> pairable =
                pieces.stream().filter(calls -> calls.size() >= 2).toList();
        assertThat(alpha.units()).isEqualTo(pairable.size());
        assertThat(ac1.units()).isEqualTo(pairable.size());
        assertThat(alpha.pairableValues())
                .isEqualTo(pairable.stream().mapToInt(List::size).sum());
        if (pairable.isEmpty()) {
            assertThat(ac1.ac1()).isNull();
            assertThat(ac1.undefined()).isNotBlank();
        } else {
            close(ac1.ac1(), PlainFindings.ac1(pieces));
        }
        if (pairable.isEmpty() || oneSided(pairable)) {
            assertThat(alpha.alpha()).isNull();
            assertThat(alpha.undefined()).isNotBlank();
        } else {
            close(alpha.alpha(), PlainFindings.alpha(pairable));
        }
    }

    private static boolean oneSided(List<List<Boolean>> pieces) {
        return pieces.stream().flatMap(List::stream).distinct().count() <= 1;
    }

    private static void check(Share share, long k, long n) {
        assertThat(share.k()).isEqualTo(k);
        assertThat(share.n()).isEqualTo(n);
        if (n == 0) {
            assertThat(share.value()).isNull();
            assertThat(share.clopperPearson()).isEqualTo(new Interval(0, 1));
            assertThat(share.wilson()).isEqualTo(new Interval(0, 1));
            return;
        }
        close(share.value(), (double) k / n);
        Interval exact = PlainFindings.clopperPearson(k, n);
        close(share.clopperPearson().lower(), exact.lower());
        close(share.clopperPearson().upper(), exact.upper());
        Interval wilson = PlainFindings.wilson(k, n);
        close(share.wilson().lower(), wilson.lower());
        close(share.wilson().upper(), wilson.upper());
    }

    private static void close(@Nullable Double found, double expected) {
        assertThat(found).isNotNull().isCloseTo(expected, within(TOLERANCE));
    }
}
