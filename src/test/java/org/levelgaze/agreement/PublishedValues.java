package org.levelgaze.agreement;

import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import java.util.function.DoubleSupplier;
import org.apache.commons.math3.distribution.NormalDistribution;
import org.jspecify.annotations.Nullable;

/** The engine's own figure for each published value, by the value's id in {@code results.csv}. */
final class PublishedValues {

    private static final double LEVEL = 0.95;
    private static final double Z = Normal.twoSided(LEVEL);

    private final Map<String, DoubleSupplier> figures = new HashMap<>();

    PublishedValues() {
        cohen();
        fleiss();
        aiag();
        shares();
        mcNemar();
        predictiveValues();
        gwetAndKrippendorff();
        signalDetection();
    }

    Map<String, DoubleSupplier> figures() {
        return figures;
    }

    private void cohen() {
        kappa("cohen1960", Reference.table(Reference.rows("cohen1960.csv"), "rater1", "rater2"));
        KappaMoments fce =
                kappa("fce1969", Reference.table(Reference.rows("fleiss_cohen_everitt1969.csv"), "rater1", "rater2"));
        figures.put("fce1969.var", () -> Math.pow(fce.standardError(), 2));
        figures.put("fce1969.var0", () -> Math.pow(fce.standardErrorUnderNull(), 2));
        kappa("fleiss1981", Reference.table(Reference.rows("fleiss_textbook1981.csv"), "rater1", "rater2"));
        KappaMoments empty = kappa(
                "empty_column", Reference.table(Reference.rows("kappa_3x3_empty_column.csv"), "rater1", "rater2"));
        figures.put(
                "empty_column.low",
                () -> Interval.around(empty.kappa(), Z * empty.standardError()).lower());
        figures.put(
                "empty_column.high",
                () -> Interval.around(empty.kappa(), Z * empty.standardError()).upper());
        figures.put("empty_column.z", () -> empty.kappa() / empty.standardErrorUnderNull());
        figures.put(
                "empty_column.p",
                () -> 2
                        * new NormalDistribution(null, 0, 1)
                                .cumulativeProbability(-empty.kappa() / empty.standardErrorUnderNull()));
        for (String where : List.of("Winnipeg", "New Orleans")) {
            List<Reference.Row> rows = Reference.rows("multiple_sclerosis.csv").stream()
                    .filter(row -> row.get("patients").equals(where))
                    .toList();
            kappa(
                    "ms." + where.toLowerCase(Locale.ROOT).replace(' ', '_'),
                    Reference.table(rows, "new_orleans_neurologist", "winnipeg_neurologist"));
        }
    }

    private KappaMoments kappa(String id, long[][] table) {
        KappaMoments moments = KappaMoments.of(table);
        figures.put(id + ".po", moments::observed);
        figures.put(id + ".pe", moments::expected);
        figures.put(id + ".kappa", moments::kappa);
        figures.put(id + ".se", moments::standardError);
        figures.put(id + ".seFCE", moments::standardError);
        figures.put(id + ".se0", moments::standardErrorUnderNull);
        return moments;
    }

    private void fleiss() {
        List<int[]> diagnoses = Reference.countedUnits("fleiss1971_diagnoses.csv", 5);
        FleissSums sums = fleiss(diagnoses, 5, 6);
        figures.put("fleiss1971.kappa", () -> kappa(sums));
        figures.put("fleiss1971.pbar", sums::observed);
        figures.put("fleiss1971.pe", sums::expected);
        figures.put(
                "fleiss1971.z",
                () -> kappa(sums) / Objects.requireNonNull(sums.result().seH0()));
        figures.put("fleiss1971.alpha", () -> alpha(diagnoses, 5));
        figures.put("fleiss1971.ac1", () -> ac1(diagnoses, 5));
        List<String> names = List.of("depression", "personality_disorder", "schizophrenia", "neurosis", "other");
        for (int category = 0; category < names.size(); category++) {
            int chosen = category;
            List<int[]> against = diagnoses.stream()
                    .map(counts -> new int[] {counts[chosen], 6 - counts[chosen]})
                    .toList();
            figures.put("fleiss1971.kappa." + names.get(category), () -> kappa(fleiss(against, 2, 6)));
        }
        figures.put("fleiss10x14.kappa", () -> kappa(fleiss(Reference.countedUnits("fleiss_10x14.csv", 5), 5, 14)));
    }

    private static FleissSums fleiss(List<int[]> units, int categories, int raters) {
        FleissSums sums = new FleissSums(categories, raters);
        units.forEach(sums::add);
        return sums;
    }

    private static double kappa(FleissSums sums) {
        return Objects.requireNonNull(sums.result().kappa());
    }

    private static double alpha(List<int[]> units, int categories) {
        KrippendorffSums sums = new KrippendorffSums(categories);
        units.forEach(sums::add);
        return Objects.requireNonNull(sums.result().alpha());
    }

    private static GwetAC1 gwet(List<int[]> units, int categories) {
        GwetSums sums = new GwetSums(categories);
        units.forEach(sums::add);
        return sums.result();
    }

    private static double ac1(List<int[]> units, int categories) {
        return Objects.requireNonNull(gwet(units, categories).ac1());
    }

    private void aiag() {
        List<Reference.Row> tables = Reference.rows("aiag_msa4_cross_tables.csv");
        for (String name : List.of("A*B", "B*C", "A*C", "A*Reference", "B*Reference", "C*Reference")) {
            kappa(
                    "aiag." + name,
                    Reference.table(
                            tables.stream()
                                    .filter(row -> row.get("table").equals(name))
                                    .toList(),
                            "first",
                            "second"));
        }
        Findings findings = Engine.assess(Reference.study("aiag_msa4_calls.csv"), Terms.STANDARD);
        findings.appraisers().forEach(this::aiag);
        TogetherFindings together = findings.together();
        percent("aiag.system.score", "aiag.system.lower95", "aiag.system.upper95", together.allRight());
        figures.put("aiag.fleissBetween", () -> value(value(together.fleiss()).kappa()));
        figures.put(
                "aiag.alphaBetween",
                () -> value(value(together.krippendorffAlpha()).alpha()));
        figures.put("aiag.ac1Between", () -> value(value(together.gwetAC1()).ac1()));
    }

    private void aiag(AppraiserFindings one) {
        String id = "aiag." + one.appraiser();
        percent(
                id + ".effectiveness",
                id + ".lower95",
                id + ".upper95",
                one.effectiveness().byPiece());
        figures.put(id + ".missRate", () -> 100 * value(one.falseAccept().value()));
        figures.put(id + ".falseAlarmRate", () -> 100 * value(one.falseReject().value()));
        SelfConsistency self = value(one.selfConsistency());
        figures.put(id + ".repeatability", () -> self.samePiece().k());
        figures.put(id + ".fleissWithin", () -> value(self.fleiss().kappa()));
    }

    private void percent(String value, String lower, String upper, Share share) {
        figures.put(value, () -> 100 * value(share.value()));
        figures.put(lower, () -> 100 * share.clopperPearson().lower());
        figures.put(upper, () -> 100 * share.clopperPearson().upper());
    }

    private void shares() {
        for (Reference.Row row : Reference.rows("proportion_intervals.csv")) {
            Share share = Share.of(Long.parseLong(row.get("k")), Long.parseLong(row.get("n")), LEVEL);
            String id = "prop." + row.get("k") + "/" + row.get("n");
            figures.put(id + ".cp.lower", () -> share.clopperPearson().lower());
            figures.put(id + ".cp.upper", () -> share.clopperPearson().upper());
            figures.put(id + ".wilson.lower", () -> share.wilson().lower());
            figures.put(id + ".wilson.upper", () -> share.wilson().upper());
        }
    }

    private void mcNemar() {
        for (Reference.Row row : Reference.rows("mcnemar.csv")) {
            long b = Long.parseLong(row.get("b_first_only"));
            long c = Long.parseLong(row.get("c_second_only"));
            figures.put(
                    "mcnemar." + row.get("example") + ".exact",
                    () -> McNemar.of(b, c).pTwoSided());
        }
    }

    private void predictiveValues() {
        for (Reference.Row row : Reference.rows("predictive_values.csv")) {
            long hits = Long.parseLong(row.get("true_positive"));
            long misses = Long.parseLong(row.get("false_negative"));
            long alarms = Long.parseLong(row.get("false_positive"));
            long passed = Long.parseLong(row.get("true_negative"));
            double sick = (double) (hits + misses) / (hits + misses + alarms + passed);
            Share missed = Share.of(misses, hits + misses, LEVEL);
            Share alarmed = Share.of(alarms, alarms + passed, LEVEL);
            String id = "pv." + row.get("example").split(" ", -1)[0].replace("scott2008", "scott");
            figures.put(id + ".ppv", () -> value(worth(sick, missed, alarmed).ppvDefectiveGivenReject()));
            figures.put(id + ".npv", () -> value(worth(sick, missed, alarmed).npvGoodGivenAccept()));
            figures.put(id + ".ppv25", () -> value(worth(0.25, missed, alarmed).ppvDefectiveGivenReject()));
            figures.put(id + ".npv25", () -> value(worth(0.25, missed, alarmed).npvGoodGivenAccept()));
            share(id + ".se", Share.of(hits, hits + misses, LEVEL));
            share(id + ".sp", Share.of(passed, alarms + passed, LEVEL));
        }
    }

    private static WorthOfACall worth(double rate, Share missed, Share alarmed) {
        return WorthOfACall.at(rate, missed.value(), alarmed.value());
    }

    private void share(String id, Share share) {
        figures.put(id + ".value", () -> value(share.value()));
        figures.put(id + ".lower", () -> share.clopperPearson().lower());
        figures.put(id + ".upper", () -> share.clopperPearson().upper());
    }

    private void gwetAndKrippendorff() {
        long[][] table = Reference.table(Reference.rows("gwet2008_125.csv"), "rater1", "rater2");
        CallTable calls = new CallTable(table[0][0], table[0][1], table[1][0], table[1][1]);
        figures.put("gwet2008.pa", () -> value(GwetAC1.toReference(calls).observedAgreement()));
        figures.put("gwet2008.ac1", () -> value(GwetAC1.toReference(calls).ac1()));
        figures.put("gwet2008.kappa", () -> value(CohenKappa.of(calls, Z).kappa()));
        FleissSums pairs = new FleissSums(2, 2);
        repeat(calls.rejectReject(), () -> pairs.add(new int[] {2, 0}));
        repeat(calls.rejectAccept() + calls.acceptReject(), () -> pairs.add(new int[] {1, 1}));
        repeat(calls.acceptAccept(), () -> pairs.add(new int[] {0, 2}));
        figures.put("gwet2008.pi", () -> kappa(pairs));

        List<int[]> four = Reference.unitCounts("krippendorff2011_4x12.csv");
        figures.put("kripp.4x12.alpha", () -> alpha(four, 5));
        figures.put("kripp.4x12.pairable", () -> {
            KrippendorffSums sums = new KrippendorffSums(5);
            four.forEach(sums::add);
            return sums.result().pairableValues();
        });
        figures.put("gwet2014.4x12.ac1", () -> ac1(four, 5));
        figures.put("kripp.binary.alpha", () -> alpha(Reference.unitCounts("krippendorff2011_binary.csv"), 2));
        figures.put("kripp.nominal.alpha", () -> alpha(Reference.unitCounts("krippendorff2011_nominal.csv"), 5));
    }

    private static void repeat(long times, Runnable action) {
        for (long at = 0; at < times; at++) {
            action.run();
        }
    }

    private void signalDetection() {
        for (Reference.Row row : Reference.rows("signal_detection.csv")) {
            long[] n = List.of("hits", "misses", "false_alarms", "correct_rejections").stream()
                    .mapToLong(name -> Long.parseLong(row.get(name)))
                    .toArray();
            double hitRate = (double) n[0] / (n[0] + n[1]);
            double alarmRate = (double) n[2] / (n[2] + n[3]);
            String id = "sdt." + row.get("example").replace(' ', '_');
            figures.put(id + ".d", () -> SignalDetection.dPrime(hitRate, alarmRate));
            figures.put(id + ".c", () -> SignalDetection.criterion(hitRate, alarmRate));
            SignalDetection detection = SignalDetection.of(n[0], n[0] + n[1], n[2], n[2] + n[3], Z);
            figures.put(id + ".d_loglinear", () -> value(detection.dPrime()));
            figures.put(id + ".c_loglinear", () -> value(detection.criterionC()));
        }
    }

    private static <T> T value(@Nullable T value) {
        return Objects.requireNonNull(value);
    }
}
