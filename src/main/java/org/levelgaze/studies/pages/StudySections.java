package org.levelgaze.studies.pages;

import java.util.ArrayList;
import java.util.List;
import java.util.function.BiConsumer;
import java.util.function.BiFunction;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.AppraiserFindings;
import org.levelgaze.agreement.Findings;
import org.levelgaze.agreement.Share;
import org.levelgaze.studies.sentences.UsualLimits;
import org.levelgaze.studies.sentences.Wording;

/** The numbers of a study, question by question: every question with its tables and what each figure means. */
final class StudySections {

    private final List<String> names;
    private final Findings findings;
    private final List<Section.Drawn> planes;
    private final UsualLimits limits;
    private final Wording words;
    private final AgreementTables agreement;

    /**
     * The sections of one study.
     *
     * @param names the appraisers' names in the order of the findings
     * @param planes their mistake planes, as many as are drawn
     */
    StudySections(
            List<String> names, Findings findings, List<Section.Drawn> planes, UsualLimits limits, Wording words) {
        this.names = names;
        this.findings = findings;
        this.planes = planes;
        this.limits = limits;
        this.words = words;
        this.agreement = new AgreementTables(names, findings, words);
    }

    List<Section> all() {
        List<@Nullable Section> sections = new ArrayList<>();
        sections.add(right());
        sections.add(mistakes());
        sections.add(lean());
        sections.add(repeats());
        sections.add(reference());
        sections.add(kinds());
        sections.add(together());
        sections.add(worth());
        sections.add(limits());
        return sections.stream().flatMap(Stream::ofNullable).toList();
    }

    private Section right() {
        List<List<String>> rows = new ArrayList<>();
        forEach((name, found) -> {
            rows.add(shareRow(name, "byPiece", found.effectiveness().byPiece()));
            if (found.effectiveness().byPieceAnyCalls().n()
                    != found.effectiveness().byPiece().n()) {
                rows.add(shareRow(name, "byPieceAnyCalls", found.effectiveness().byPieceAnyCalls()));
            }
            rows.add(shareRow(name, "byCall", found.effectiveness().byCall()));
        });
        return section("right", List.of(shareTable(rows)), "byPiece", "byCall", "interval");
    }

    private Section mistakes() {
        List<List<String>> rows = new ArrayList<>();
        forEach((name, found) -> {
            rows.add(shareRow(name, "falseAccept", found.falseAccept()));
            rows.add(shareRow(name, "falseReject", found.falseReject()));
        });
        List<Table> tables = List.of(shareTable(rows), ratios());
        return balanced()
                ? section("mistakes", tables, "falseAccept", "falseReject", "ratio", "leanTest", "mcnemar")
                : section("mistakes", tables, "falseAccept", "falseReject", "ratio", "leanTest");
    }

    private Table ratios() {
        List<String> head = head("appraiser", "ratio", "interval", "ratioOfCounts", "leanTest");
        return table("ratios", balanced() ? with(head, column("mcnemar")) : head, rows((name, found) -> {
            var ratio = found.biasRatio();
            List<String> row = List.of(
                    name,
                    ratio.ofRates() == null
                            ? words.say("studies.ratio." + ratio.status())
                            : words.number(ratio.ofRates()),
                    words.range(ratio.interval()),
                    words.number(ratio.ofCounts()),
                    words.probability(found.leanTest().pTwoSided()));
            return balanced() ? with(row, words.probability(found.mcnemar().pTwoSided())) : row;
        }));
    }

    /** McNemar's test on counts says nothing about lean when a set is unbalanced. */
    private boolean balanced() {
        return limits.balanced(
                findings.study().defectivePieces(), findings.study().pieces());
    }

    private Section lean() {
        Table table =
                table("", head("appraiser", "c", "interval", "lean", "dPrime", "interval"), rows((name, found) -> {
                    var signal = found.signalDetection();
                    String lean = Estimates.flawless(found)
                            ? words.say("studies.lean.flawless")
                            : words.say("studies.lean." + signal.lean());
                    return List.of(
                            name,
                            words.number(signal.criterionC()),
                            words.range(signal.criterionCInterval()),
                            lean,
                            words.number(signal.dPrime()),
                            words.range(signal.dPrimeInterval()));
                }));
        return section("lean", List.of(table), "c", "dPrime");
    }

    private @Nullable Section repeats() {
        List<List<String>> rows = new ArrayList<>();
        forEach((name, found) -> {
            var self = found.selfConsistency();
            if (self != null) {
                rows.add(shareRow(name, "samePiece", self.samePiece()));
            }
        });
        return rows.isEmpty()
                ? null
                : section("repeats", List.of(shareTable(rows), agreement.withOneself()), "samePiece", "beyondChance");
    }

    private Section reference() {
        List<Table> tables = new ArrayList<>();
        tables.add(agreement.withTruth());
        tables.addAll(agreement.truthTables());
        return section("reference", tables, "kappa", "ac1");
    }

    private @Nullable Section kinds() {
        List<List<String>> rows = new ArrayList<>();
        forEach((name, found) -> {
            var kinds = found.byDefectKind();
            if (kinds != null) {
                kinds.forEach(kind -> {
                    rows.add(with(shareRow(name, "detected", kind.detected()), 1, kind.kind()));
                    rows.add(with(shareRow(name, "named", kind.named()), 1, kind.kind()));
                });
            }
        });
        List<String> head = head("appraiser", "kind", "what", "count", "share", "exact", "wilson");
        return rows.isEmpty() ? null : section("kinds", List.of(table("", head, rows)), "detected", "named");
    }

    private @Nullable Section together() {
        if (names.size() < 2) {
            return null;
        }
        var together = findings.together();
        String all = words.say("studies.everybody");
        List<List<String>> rows = new ArrayList<>(List.of(shareRow(all, "allRight", together.allRight())));
        if (together.allSame() != null) {
            rows.add(shareRow(all, "allSame", together.allSame()));
        }
        List<Table> tables = List.of(shareTable(rows), agreement.pairs(), agreement.amongAll());
        return section("together", tables, "allRight", "allSame", "kappa", "beyondChance");
    }

    private Section worth() {
        List<List<String>> rows = new ArrayList<>();
        forEach((name, found) -> found.worthOfACall()
                .forEach((rate, worth) -> rows.add(List.of(
                        name,
                        words.limit(Double.parseDouble(rate)),
                        percent(worth.ppvDefectiveGivenReject()),
                        percent(worth.goodAmongRejected()),
                        percent(worth.defectiveAmongAccepted()),
                        percent(worth.rejectShare())))));
        List<String> head =
                head("appraiser", "rate", "ppv", "goodAmongRejected", "defectiveAmongAccepted", "rejectShare");
        return section("worth", List.of(table("", head, rows)), "ppv", "defectiveAmongAccepted");
    }

    private Section limits() {
        List<List<String>> rows = List.of(
                limitRow("byPiece", "least", limits.minEffectiveness(), limits.remarkBelowEffectiveness()),
                limitRow("falseAccept", "most", limits.maxFalseAccept(), limits.remarkAboveFalseAccept()),
                limitRow("falseReject", "most", limits.maxFalseReject(), limits.remarkAboveFalseReject()),
                List.of(
                        words.say("studies.term.ratio"),
                        words.say("studies.limit.least", words.number(limits.minBiasRatio())),
                        words.say("studies.limit.none"),
                        words.say("studies.limit.practice")));
        return section("limits", List.of(table("", head("figure", "limit", "remark", "source"), rows)));
    }

    private List<String> limitRow(String figure, String side, double limit, double remark) {
        return List.of(
                words.say("studies.term." + figure),
                words.say("studies.limit." + side, words.limit(limit)),
                words.say("studies.limit." + side, words.limit(remark)),
                words.say("studies.limit.aiag"));
    }

    private Section section(String name, List<Table> tables, String... terms) {
        List<Section.Term> meanings = Stream.of(terms)
                .map(term -> new Section.Term(
                        words.say("studies.term." + term), words.say("studies.term." + term + ".means")))
                .toList();
        String note = words.say("studies.ask." + name + ".note");
        List<Section.Drawn> pictures = "mistakes".equals(name) ? planes : List.of();
        return new Section(words.say("studies.ask." + name), List.of(note), tables, pictures, meanings);
    }

    private Table shareTable(List<List<String>> rows) {
        return table("", head("appraiser", "what", "count", "share", "exact", "wilson"), rows);
    }

    private List<String> shareRow(String name, String what, Share share) {
        return List.of(
                name,
                words.say("studies.term." + what),
                words.counts(share),
                words.percent(share),
                words.range(share.clopperPearson(), share.n()),
                words.range(share.wilson(), share.n()));
    }

    private String percent(@Nullable Double share) {
        return words.percent(share, findings.study().callsMade());
    }

    private Table table(String caption, List<String> head, List<List<String>> rows) {
        return new Table(caption.isEmpty() ? "" : words.say("studies.table." + caption), head, rows);
    }

    private List<String> head(String... columns) {
        return Stream.of(columns).map(this::column).toList();
    }

    private String column(String name) {
        return words.say("studies.column." + name);
    }

    private List<List<String>> rows(BiFunction<String, AppraiserFindings, List<String>> row) {
        List<List<String>> rows = new ArrayList<>();
        forEach((name, found) -> rows.add(row.apply(name, found)));
        return rows;
    }

    private void forEach(BiConsumer<String, AppraiserFindings> visitor) {
        for (int number = 0; number < names.size(); number++) {
            visitor.accept(names.get(number), findings.appraisers().get(number));
        }
    }

    private static List<String> with(List<String> cells, String last) {
        return with(cells, cells.size(), last);
    }

    private static List<String> with(List<String> cells, int at, String cell) {
        List<String> more = new ArrayList<>(cells);
        more.add(at, cell);
        return more;
    }
}
