package org.levelgaze.agreement;

/** Counts the calls of all appraisers on each piece. */
final class PieceTotals {

    private final Study study;
    private final int[] made;
    private final int[] rejects;
    private final int callsPerPiece;
    private final RatingSums ratings;

    private long complete;
    private long right;
    private long same;

    PieceTotals(Study study) {
        this.study = study;
        made = new int[study.defective.length];
        rejects = new int[study.defective.length];
        int sum = 0;
        for (int appraiser = 0; appraiser < study.appraisers().size(); appraiser++) {
            sum += study.trials(appraiser);
        }
        callsPerPiece = sum;
        ratings = new RatingSums(callsPerPiece);
    }

    void add(int piece, int calls, int rejected) {
        made[piece] += calls;
        rejects[piece] += rejected;
    }

    /** Ends the counting: every appraiser has been added. */
    void close() {
        for (int piece = 0; piece < made.length; piece++) {
            if (made[piece] == 0) {
                continue;
            }
            ratings.add(made[piece], rejects[piece]);
            if (made[piece] == callsPerPiece) {
                complete++;
                right += rejects[piece] == (study.defective[piece] ? callsPerPiece : 0) ? 1 : 0;
                same += rejects[piece] == 0 || rejects[piece] == callsPerPiece ? 1 : 0;
            }
        }
    }

    /** The calls on a complete piece: the sum of every appraiser's trials. */
    int callsPerPiece() {
        return callsPerPiece;
    }

    long complete() {
        return complete;
    }

    long right() {
        return right;
    }

    long same() {
        return same;
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
