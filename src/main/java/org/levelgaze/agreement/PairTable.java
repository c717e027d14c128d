package org.levelgaze.agreement;

/** Puts the calls of two appraisers side by side: same piece, same trial number, both judged. */
final class PairTable {

    private PairTable() {}

    /** Both stand in the order of pieces and trials, so one walk through the two finds the common calls. */
    static CallTable of(Study study, int first, int second) {
        int one = study.from[first];
        int other = study.from[second];
        int oneEnd = study.from[first + 1];
        int otherEnd = study.from[second + 1];
        long[] counts = new long[4];
        while (one < oneEnd && other < otherEnd) {
            int order = study.piece[one] - study.piece[other];
            if (order == 0) {
                order = study.trial[one] - study.trial[other];
            }
            if (order == 0) {
                counts[study.reject[one] * 2 + study.reject[other]]++;
            }
            one += order <= 0 ? 1 : 0;
            other += order >= 0 ? 1 : 0;
        }
        return new CallTable(counts[3], counts[2], counts[1], counts[0]);
    }
}
