package org.levelgaze.demo;

import java.util.List;
import java.util.SplittableRandom;

/** Writes the file of calls that a study of the invented plant would bring. */
final class CallSheet {

    private final StringBuilder csv = new StringBuilder("piece,reference,appraiser,trial,call,defect,seen\n");

    CallSheet(List<DemoPiece> pieces, List<Judge> judges, int trials, double years, SplittableRandom chance) {
        for (Judge judge : judges) {
            for (int trial = 1; trial <= trials; trial++) {
                for (DemoPiece piece : pieces) {
                    add(piece, judge, trial, judge.accepts(piece, years, chance), chance);
                }
            }
        }
    }

    private void add(DemoPiece piece, Judge judge, int trial, boolean accepted, SplittableRandom chance) {
        String defect = piece.defect() == null ? "" : piece.defect();
        String seen = accepted ? "" : seen(defect, chance);
        csv.append(String.join(
                        ",",
                        piece.label(),
                        piece.defective() ? "defective" : "good",
                        judge.code(),
                        Integer.toString(trial),
                        accepted ? "accept" : "reject",
                        defect,
                        seen))
                .append('\n');
    }

    /** One defect in eight is found and called by another name. */
    private static String seen(String defect, SplittableRandom chance) {
        return defect.isEmpty() || chance.nextInt(8) == 0 ? "other" : defect;
    }

    String csv() {
        return csv.toString();
    }
}
