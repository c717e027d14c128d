package org.levelgaze.cli;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.levelgaze.agreement.AppraiserFindings;
import org.levelgaze.agreement.AppraiserPair;
import org.levelgaze.agreement.CohenKappa;
import org.levelgaze.agreement.DefectKindFindings;
import org.levelgaze.agreement.Findings;
import org.levelgaze.agreement.SelfConsistency;
import org.levelgaze.agreement.SignalDetection;
import org.levelgaze.agreement.TogetherFindings;
import org.levelgaze.agreement.WorthOfACall;

/** Findings as plain text: sentences first, then the numbers under the questions that they answer. */
final class FindingsText {

    private final Console console;
    private final Findings findings;
    private final Figures figures;
    private final Page page = new Page();

    FindingsText(Console console, Findings findings) {
        this.console = console;
        this.findings = findings;
        this.figures = new Figures(console.locale());
    }

    String text() {
        new FindingsSentences(console, findings, figures).writeTo(page);
        right();
        mistakes();
        self();
        truth();
        together();
        worth();
        kinds();
        return page.text();
    }

    private void right() {
        List<List<String>> rows = table("right", 5);
        for (AppraiserFindings one : findings.appraisers()) {
            rows.add(List.of(
                    one.appraiser(),
                    figures.counts(one.effectiveness().byPiece()),
                    figures.percent(one.effectiveness().byPiece()),
                    figures.range(one.effectiveness().byPiece()),
                    figures.percent(one.effectiveness().byCall())));
        }
        write("right", rows);
    }

    private void mistakes() {
        List<List<String>> rows = table("mistakes", 7);
        for (AppraiserFindings one : findings.appraisers()) {
            rows.add(List.of(
                    one.appraiser(),
                    figures.counts(one.falseAccept()),
                    figures.range(one.falseAccept()),
                    figures.counts(one.falseReject()),
                    figures.range(one.falseReject()),
                    figures.number(one.biasRatio().ofRates()),
                    figures.range(one.biasRatio().interval(), console.text("cli.assess.up"))));
        }
        write("mistakes", rows);
        lean();
    }

    private void lean() {
        List<List<String>> rows = table("lean", 5);
        for (AppraiserFindings one : findings.appraisers()) {
            SignalDetection detection = one.signalDetection();
            rows.add(List.of(
                    one.appraiser(),
                    figures.number(detection.criterionC()),
                    figures.range(detection.criterionCInterval(), ""),
                    figures.number(detection.dPrime()),
                    figures.range(detection.dPrimeInterval(), "")));
        }
        write("lean", rows);
    }

    private void self() {
        List<List<String>> rows = table("self", 7);
        for (AppraiserFindings one : findings.appraisers()) {
            SelfConsistency self = one.selfConsistency();
            if (self != null) {
                rows.add(List.of(
                        one.appraiser(),
                        figures.counts(self.samePiece()),
                        figures.percent(self.samePiece()),
                        figures.range(self.samePiece()),
                        figures.number(self.fleiss().kappa()),
                        figures.number(self.krippendorffAlpha().alpha()),
                        figures.number(self.gwetAC1().ac1())));
            }
        }
        write("self", rows);
    }

    private void truth() {
        List<List<String>> rows = table("truth", 8);
        for (AppraiserFindings one : findings.appraisers()) {
            List<String> row = kappa(one.appraiser(), one.kappaToReference());
            row.add(figures.number(one.ac1ToReference().ac1()));
            rows.add(row);
        }
        write("truth", rows);
    }

    private void together() {
        TogetherFindings together = findings.together();
        if (findings.appraisers().size() < 2) {
            return;
        }
        List<List<String>> rows = table("pairs", 7);
        for (AppraiserPair pair : together.pairs()) {
            rows.add(kappa(console.text("cli.assess.pair", pair.first(), pair.second()), pair.kappa()));
        }
        write("pairs", rows);
        List<List<String>> all = table("all", 4);
        all.add(row(
                console.text("cli.assess.all.right"),
                figures.counts(together.allRight()),
                figures.percent(together.allRight()),
                figures.range(together.allRight())));
        if (together.allSame() != null) {
            all.add(row(
                    console.text("cli.assess.all.same"),
                    figures.counts(together.allSame()),
                    figures.percent(together.allSame()),
                    figures.range(together.allSame())));
        }
        write("all", all);
    }

    private void worth() {
        List<List<String>> rows = table("worth", 5);
        for (AppraiserFindings one : findings.appraisers()) {
            for (Map.Entry<String, WorthOfACall> entry : one.worthOfACall().entrySet()) {
                WorthOfACall worth = entry.getValue();
                rows.add(row(
                        one.appraiser(),
                        figures.flow(Double.valueOf(entry.getKey())),
                        figures.flow(worth.rejectShare()),
                        figures.flow(worth.ppvDefectiveGivenReject()),
                        figures.flow(worth.defectiveAmongAccepted())));
            }
        }
        write("worth", rows);
    }

    private void kinds() {
        List<List<String>> rows = table("kinds", 6);
        for (AppraiserFindings one : findings.appraisers()) {
            if (one.byDefectKind() != null) {
                for (DefectKindFindings kind : one.byDefectKind()) {
                    rows.add(row(
                            console.text("cli.assess.pair", one.appraiser(), kind.kind()),
                            figures.counts(kind.detected()),
                            figures.percent(kind.detected()),
                            figures.range(kind.detected()),
                            figures.counts(kind.named()),
                            figures.percent(kind.named())));
                }
            }
        }
        write("kinds", rows);
    }

    private List<String> kappa(String name, CohenKappa kappa) {
        List<String> row = new ArrayList<>();
        row.add(name);
        row.add(Long.toString(kappa.table().rejectReject()));
        row.add(Long.toString(kappa.table().rejectAccept()));
        row.add(Long.toString(kappa.table().acceptReject()));
        row.add(Long.toString(kappa.table().acceptAccept()));
        row.add(figures.number(kappa.kappa()));
        row.add(figures.range(kappa.interval(), ""));
        return row;
    }

    private static List<String> row(String... cells) {
        return List.of(cells);
    }

    /** A table that begins with the names of its columns. */
    private List<List<String>> table(String section, int columns) {
        List<String> names = new ArrayList<>();
        for (int at = 1; at <= columns; at++) {
            names.add(console.text("cli.assess." + section + "." + at));
        }
        List<List<String>> rows = new ArrayList<>();
        rows.add(names);
        return rows;
    }

    /** Writes a section that has more than the names of its columns. */
    private void write(String section, List<List<String>> rows) {
        if (rows.size() > 1) {
            page.title(console.text("cli.assess." + section + ".title"));
            page.table(rows);
            page.sentence(console.text("cli.assess." + section + ".note"));
        }
    }
}
