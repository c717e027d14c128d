package org.levelgaze.studies.pages;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.AppraiserFindings;
import org.levelgaze.agreement.AppraiserPair;
import org.levelgaze.agreement.CallTable;
import org.levelgaze.agreement.CohenKappa;
import org.levelgaze.agreement.Findings;
import org.levelgaze.agreement.FleissKappa;
import org.levelgaze.agreement.GwetAC1;
import org.levelgaze.agreement.Interval;
import org.levelgaze.agreement.KrippendorffAlpha;
import org.levelgaze.studies.sentences.Wording;

/** Tables of agreement beyond chance; a kappa never stands without the counts it comes from. */
final class AgreementTables {

    private final List<String> names;
    private final Findings findings;
    private final Wording words;

    AgreementTables(List<String> names, Findings findings, Wording words) {
        this.names = names;
        this.findings = findings;
        this.words = words;
    }

    /** Each appraiser's trials among themselves. */
    Table withOneself() {
        List<List<String>> rows = new ArrayList<>();
        for (int number = 0; number < names.size(); number++) {
            var self = findings.appraisers().get(number).selfConsistency();
            if (self != null) {
                rows.add(beyondChance(names.get(number), self.fleiss(), self.krippendorffAlpha(), self.gwetAC1()));
            }
        }
        return new Table(words.say("studies.table.beyondChance"), head("appraiser", "fleiss", "alpha", "ac1"), rows);
    }

    /** All appraisers and trials among themselves. */
    Table amongAll() {
        var together = findings.together();
        List<String> row = beyondChance(
                words.say("studies.everybody"), together.fleiss(), together.krippendorffAlpha(), together.gwetAC1());
        return new Table(
                words.say("studies.table.amongAll"), head("appraiser", "fleiss", "alpha", "ac1"), List.of(row));
    }

    /** Each appraiser against the true states. */
    Table withTruth() {
        List<List<String>> rows = IntStream.range(0, names.size())
                .mapToObj(number -> {
                    AppraiserFindings found = findings.appraisers().get(number);
                    List<String> row = new ArrayList<>(kappaRow(names.get(number), found.kappaToReference()));
                    row.add(words.number(found.ac1ToReference().ac1()));
                    return row;
                })
                .toList();
        return new Table("", head("appraiser", "kappa", "interval", "observed", "expected", "ac1"), rows);
    }

    /** The counts behind each appraiser's kappa. */
    List<Table> truthTables() {
        List<List<String>> rows = IntStream.range(0, names.size())
                .mapToObj(number -> counts(
                        names.get(number),
                        findings.appraisers().get(number).kappaToReference().table()))
                .toList();
        List<String> head = head("appraiser", "rejectReject", "rejectAccept", "acceptReject", "acceptAccept");
        return List.of(new Table(words.say("studies.table.truth"), head, rows));
    }

    /** Every two appraisers, with the counts behind their kappa. */
    Table pairs() {
        Map<String, String> nameOf = IntStream.range(0, names.size())
                .boxed()
                .collect(Collectors.toMap(
                        number -> findings.appraisers().get(number).appraiser(), names::get));
        List<List<String>> rows = findings.together().pairs().stream()
                .map(pair -> pairRow(pair, nameOf))
                .toList();
        return new Table(
                words.say("studies.table.pairs"),
                head(
                        "pair",
                        "kappa",
                        "interval",
                        "observed",
                        "expected",
                        "bothReject",
                        "firstOnly",
                        "secondOnly",
                        "bothAccept"),
                rows);
    }

    private List<String> pairRow(AppraiserPair pair, Map<String, String> nameOf) {
        String both = words.say(
                "studies.pair",
                nameOf.getOrDefault(pair.first(), pair.first()),
                nameOf.getOrDefault(pair.second(), pair.second()));
        List<String> row = new ArrayList<>(kappaRow(both, pair.kappa()));
        List<String> counted = counts("", pair.kappa().table());
        row.addAll(counted.subList(1, counted.size()));
        return row;
    }

    private List<String> kappaRow(String name, CohenKappa kappa) {
        return List.of(
                name,
                kappa.kappa() == null ? words.say("studies.undefined") : words.number(kappa.kappa()),
                words.range(upToOne(kappa.interval())),
                words.percent(kappa.observedAgreement(), kappa.n()),
                words.percent(kappa.expectedAgreement(), kappa.n()));
    }

    /** No kappa exceeds 1, but the normal approximation of its interval may; the files keep it as computed. */
    private static @Nullable Interval upToOne(@Nullable Interval interval) {
        return interval == null ? null : new Interval(interval.lower(), Math.min(1, interval.upper()));
    }

    private List<String> counts(String name, CallTable table) {
        return List.of(
                name,
                words.count(table.rejectReject()),
                words.count(table.rejectAccept()),
                words.count(table.acceptReject()),
                words.count(table.acceptAccept()));
    }

    private List<String> beyondChance(
            String name, @Nullable FleissKappa fleiss, @Nullable KrippendorffAlpha alpha, @Nullable GwetAC1 ac1) {
        return List.of(
                name,
                words.number(fleiss == null ? null : fleiss.kappa()),
                words.number(alpha == null ? null : alpha.alpha()),
                words.number(ac1 == null ? null : ac1.ac1()));
    }

    private List<String> head(String... columns) {
        return Stream.of(columns)
                .map(column -> words.say("studies.column." + column))
                .toList();
    }
}
