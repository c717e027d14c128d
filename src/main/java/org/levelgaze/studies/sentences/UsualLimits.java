package org.levelgaze.studies.sentences;

/**
 * What a study is held against. The values of {@link #COMMON_PRACTICE} stand for every task: bands of the AIAG manual (Measurement Systems Analysis, 4th ed., from
 * memory) and common practice. Requirements of a customer come first.
 *
 * @param minEffectiveness least share of pieces called right every time
 * @param remarkBelowEffectiveness below this share a remark
 * @param maxFalseAccept largest share of defective pieces let through
 * @param remarkAboveFalseAccept above this share a remark
 * @param maxFalseReject largest share of good pieces refused
 * @param remarkAboveFalseReject above this share a remark
 * @param minBiasRatio least false reject / false accept, of rates
 * @param minPieces least number of pieces
 * @param defectiveShare the share of defective pieces that a set should have
 * @param defectiveShareTolerance how far it may lie from that
 * @param mostTrials above this many looks at a piece, intervals by call are too narrow to go unmentioned
 */
public record UsualLimits(
        double minEffectiveness,
        double remarkBelowEffectiveness,
        double maxFalseAccept,
        double remarkAboveFalseAccept,
        double maxFalseReject,
        double remarkAboveFalseReject,
        double minBiasRatio,
        int minPieces,
        double defectiveShare,
        double defectiveShareTolerance,
        int mostTrials) {

    /** Effectiveness 80 and 90 %, false accept 5 and 2 %, false reject 10 and 5 %, bias ratio 1, 20 pieces, half of them defective. */
    public static final UsualLimits COMMON_PRACTICE =
            new UsualLimits(0.80, 0.90, 0.05, 0.02, 0.10, 0.05, 1.0, 20, 0.5, 0.10, 3);

    /** Whether so many defective pieces among so many keep the set balanced. */
    public boolean balanced(int defective, int pieces) {
        double share = pieces == 0 ? 0 : (double) defective / pieces;
        return Math.abs(share - defectiveShare) <= defectiveShareTolerance + 1e-9;
    }
}
