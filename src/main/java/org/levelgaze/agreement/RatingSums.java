package org.levelgaze.agreement;

/** Gathers the calls on each piece for the three coefficients of agreement among many raters. */
final class RatingSums {

    private final int raters;
    private final int[] counts = new int[2];
    private final FleissSums fleiss;
    private final KrippendorffSums alpha = new KrippendorffSums(2);
    private final GwetSums ac1 = new GwetSums(2);

    /** A piece is complete when it has this many calls. */
    RatingSums(int raters) {
        this.raters = raters;
        this.fleiss = new FleissSums(2, raters);
    }

    void add(int made, int rejects) {
        counts[0] = made - rejects;
        counts[1] = rejects;
        if (made == raters) {
            fleiss.add(counts);
        }
        alpha.add(counts);
        ac1.add(counts);
    }

    FleissKappa fleiss() {
        return fleiss.result();
    }

    KrippendorffAlpha alpha() {
        return alpha.result();
    }

    GwetAC1 ac1() {
        return ac1.result();
    }
}
