package org.levelgaze.agreement;

/** Counts the calls of one appraiser, piece by piece. */
final class Tally {

    private final Study study;
    private final int appraiser;
    private final int trials;
    private final RatingSums ratings;

    private long defectiveCalls;
    private long goodCalls;
    private long hits;
    private long falseRejects;
    private long judgedPieces;
    private long judgedRight;
    private long repeatedPieces;
    private long repeatedSame;
    private long completePieces;
    private long completeRight;
    private long completeSame;

    Tally(Study study, int appraiser) {
        this.study = study;
        this.appraiser = appraiser;
        this.trials = study.trials(appraiser);
        this.ratings = new RatingSums(trials);
    }

    /** One pass over his calls, which stand together piece by piece; adds them to the totals of all appraisers. */
    void count(PieceTotals totals) {
        int end = study.from[appraiser + 1];
        int at = study.from[appraiser];
        while (at < end) {
            int piece = study.piece[at];
            int first = at;
            int rejects = 0;
            while (at < end && study.piece[at] == piece) {
                rejects += study.reject[at++];
            }
            add(at - first, rejects, study.defective[piece]);
            totals.add(piece, at - first, rejects);
        }
    }

    private void add(int made, int rejects, boolean defective) {
        boolean right;
        if (defective) {
            defectiveCalls += made;
            hits += rejects;
            right = rejects == made;
        } else {
            goodCalls += made;
            falseRejects += rejects;
            right = rejects == 0;
        }
        boolean same = rejects == 0 || rejects == made;
        judgedPieces++;
        judgedRight += right ? 1 : 0;
        if (made >= 2) {
            repeatedPieces++;
            repeatedSame += same ? 1 : 0;
        }
        if (made == trials) {
            completePieces++;
            completeRight += right ? 1 : 0;
            completeSame += same ? 1 : 0;
        }
        ratings.add(made, rejects);
    }

    int trials() {
        return trials;
    }

    long calls() {
        return defectiveCalls + goodCalls;
    }

    long defectiveCalls() {
        return defectiveCalls;
    }

    long goodCalls() {
        return goodCalls;
    }

    long hits() {
        return hits;
    }

    long missed() {
        return defectiveCalls - hits;
    }

    long falseRejects() {
        return falseRejects;
    }

    long rightCalls() {
        return calls() - missed() - falseRejects;
    }

    long judgedPieces() {
        return judgedPieces;
    }

    long judgedRight() {
        return judgedRight;
    }

    long repeatedPieces() {
        return repeatedPieces;
    }

    long repeatedSame() {
        return repeatedSame;
    }

    long completePieces() {
        return completePieces;
    }

    long completeRight() {
        return completeRight;
    }

    long completeSame() {
        return completeSame;
    }

    CallTable table() {
        return new CallTable(hits, falseRejects, missed(), goodCalls - falseRejects);
    }

    FleissKappa fleiss() {
        return ratings.fleiss();
    }

    KrippendorffAlpha alpha() {
        return ratings.alpha();
    }

    GwetAC1 ac1() {
        return ratings.ac1();
    }
}
