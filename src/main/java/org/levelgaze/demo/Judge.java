package org.levelgaze.demo;

import java.util.SplittableRandom;

/**
 * An invented appraiser: how often he lets a defective piece through and keeps a good one back, when the plant begins and
 * how that moves in a year. A piece that is hard to call doubles both.
 *
 * @param code his code
 * @param miss chance of accepting a clear defective piece at the beginning
 * @param missAfterAYear the same a year later
 * @param falseReject chance of rejecting a clear good piece
 */
record Judge(String code, double miss, double missAfterAYear, double falseReject) {

    private static final double LARGEST = 0.6;

    boolean accepts(DemoPiece piece, double years, SplittableRandom chance) {
        double wrong = piece.defective() ? miss + (missAfterAYear - miss) * years : falseReject;
        double here = Math.min(LARGEST, piece.hard() ? 2 * wrong : wrong);
        boolean mistaken = chance.nextDouble() < Math.max(0, here);
        return piece.defective() == mistaken;
    }
}
