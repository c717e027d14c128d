package org.levelgaze.cli;

import org.levelgaze.agreement.AppraiserFindings;
import org.levelgaze.agreement.Findings;
import org.levelgaze.agreement.Share;
import org.levelgaze.agreement.StudyShape;

/** What findings say in plain words, before any table. */
final class FindingsSentences {

    /** Common practice, no source: below this share of the set, one side of it is called small. */
    private static final double SMALL_SIDE = 0.3;

    /** Intervals by call are too narrow when pieces are looked at more often. */
    private static final int MANY_TRIALS = 3;

    private final Console console;
    private final Findings findings;
    private final Figures figures;

    FindingsSentences(Console console, Findings findings, Figures figures) {
        this.console = console;
        this.findings = findings;
        this.figures = figures;
    }

    void writeTo(Page page) {
        page.title(console.text("cli.assess.title"));
        StudyShape study = findings.study();
        page.sentence(console.text(
                "cli.assess.shape",
                study.pieces(),
                study.defectivePieces(),
                study.goodPieces(),
                study.appraisers(),
                study.trials(),
                study.callsMade(),
                study.callsPlanned(),
                figures.level(findings.confidence())));
        balance(page, study);
        if (study.trials() > MANY_TRIALS) {
            page.sentence(console.text("cli.assess.many-trials", study.trials()));
        }
        for (AppraiserFindings one : findings.appraisers()) {
            page.title(one.appraiser());
            page.sentence(effective(one));
            page.sentence(mistakes(one));
        }
    }

    private void balance(Page page, StudyShape study) {
        int defective = study.defectivePieces();
        int good = study.goodPieces();
        boolean fewDefective = defective < good;
        int fewer = Math.min(defective, good);
        if (fewer < SMALL_SIDE * study.pieces()) {
            String key = fewDefective ? "cli.assess.few-defective" : "cli.assess.few-good";
            String weight = fewer == 0 ? Figures.NONE : figures.level(Math.rint(1000.0 / fewer) / 1000);
            page.sentence(console.text(fewer == 0 ? key + ".none" : key, fewer, study.pieces(), weight));
        }
    }

    private String effective(AppraiserFindings one) {
        Share byPiece = one.effectiveness().byPiece();
        if (byPiece.n() == 0) {
            return console.text("cli.assess.effective.none");
        }
        return console.text(
                "cli.assess.effective", byPiece.k(), byPiece.n(), figures.percent(byPiece), figures.range(byPiece));
    }

    private String mistakes(AppraiserFindings one) {
        Share accept = one.falseAccept();
        Share reject = one.falseReject();
        String counts = console.text("cli.assess.mistakes.counts", accept.k(), accept.n(), reject.k(), reject.n());
        if (one.calls() == 0) {
            return console.text("cli.assess.mistakes.unjudged");
        }
        if (accept.k() + reject.k() == 0) {
            return counts + " " + console.text("cli.assess.mistakes.none");
        }
        String lean = switch (one.signalDetection().lean()) {
            case LENIENT -> "cli.assess.mistakes.lenient";
            case EVEN -> "cli.assess.mistakes.even";
            case STRICT -> "cli.assess.mistakes.strict";
        };
        return counts + " " + console.text(lean);
    }
}
