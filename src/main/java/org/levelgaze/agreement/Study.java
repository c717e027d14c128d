package org.levelgaze.agreement;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * The calls of one study, and the true state of every piece. Immutable. Calls stand in columns, ordered by appraiser,
 * piece and trial; memory grows with the number of calls, not with pieces x trials. A call that was not made has no place.
 *
 * <p>Pieces, appraisers and defect kinds are known by their place in the order of first appearance, from 0.
 */
public final class Study {

    /** No defect kind. */
    public static final int NO_KIND = -1;

    /** Takes one call after the other. */
    @FunctionalInterface
    public interface CallVisitor {

        /**
         * One call.
         *
         * @param piece place of the piece
         * @param appraiser place of the appraiser
         * @param trial number of the trial, from 1
         * @param call the call
         * @param seenKind place of the defect kind that was named, {@link #NO_KIND} when none was
         */
        void call(int piece, int appraiser, int trial, Call call, int seenKind);
    }

    private final List<Piece> pieces;
    private final List<String> appraisers;
    private final List<String> kinds;
    private final int[] trials;

    /** True by piece: it is defective. */
    final boolean[] defective;
    /** By piece: place of its true defect kind, or none. */
    final int[] trueKind;
    /** By appraiser, and one more: where his calls begin. */
    final int[] from;
    /** By call: place of the piece. */
    final int[] piece;
    /** By call: number of the trial. */
    final int[] trial;
    /** By call: 1 for a reject, 0 for an accept. */
    final byte[] reject;
    /** By call: place of the defect kind named; {@code null} when no call names any. */
    final int @Nullable [] seen;

    Study(StudyBuilder parts) {
        pieces = List.copyOf(parts.pieces);
        appraisers = List.copyOf(parts.appraisers.keySet());
        kinds = List.copyOf(parts.kinds.keySet());
        int[] order = CallOrder.of(parts.calls, parts.appraiser, parts.piece, parts.trial);
        piece = CallOrder.arranged(parts.piece, order);
        trial = CallOrder.arranged(parts.trial, order);
        seen = parts.anySeen ? CallOrder.arranged(parts.seen, order) : null;
        reject = CallOrder.arranged(parts.reject, order);
        from = starts(appraisers.size(), parts.appraiser, order.length);
        trials = highestTrials();
        defective = new boolean[pieces.size()];
        trueKind = new int[pieces.size()];
        for (int at = 0; at < defective.length; at++) {
            Piece one = pieces.get(at);
            defective[at] = one.truth() == TrueState.DEFECTIVE;
            trueKind[at] = one.defectKind() == null || !defective[at] ? NO_KIND : parts.kind(one.defectKind());
        }
        refuseRepeats();
    }

    /** Puts a study together. */
    public static StudyBuilder builder() {
        return new StudyBuilder(512);
    }

    /**
     * Puts a study together.
     *
     * @param calls how many calls to expect; more or fewer are fine
     */
    public static StudyBuilder builder(int calls) {
        return new StudyBuilder(calls);
    }

    /** The pieces in order. */
    public List<Piece> pieces() {
        return pieces;
    }

    /** The appraisers' codes in order. */
    public List<String> appraisers() {
        return appraisers;
    }

    /** The defect kinds, true or seen, in order. */
    public List<String> kinds() {
        return kinds;
    }

    /** The highest trial number with a call of this appraiser, 0 when he made none. */
    public int trials(int appraiser) {
        return trials[appraiser];
    }

    /** How many calls were made. */
    public int calls() {
        return piece.length;
    }

    /** Shows every call to the visitor, by appraiser, piece and trial. */
    public void forEachCall(CallVisitor visitor) {
        for (int appraiser = 0; appraiser < trials.length; appraiser++) {
            for (int at = from[appraiser]; at < from[appraiser + 1]; at++) {
                Call call = reject[at] == 1 ? Call.REJECT : Call.ACCEPT;
                visitor.call(piece[at], appraiser, trial[at], call, seen == null ? NO_KIND : seen[at]);
            }
        }
    }

    private int[] highestTrials() {
        int[] highest = new int[from.length - 1];
        for (int appraiser = 0; appraiser < highest.length; appraiser++) {
            for (int at = from[appraiser]; at < from[appraiser + 1]; at++) {
                highest[appraiser] = Math.max(highest[appraiser], trial[at]);
            }
        }
        return highest;
    }

    private void refuseRepeats() {
        for (int appraiser = 0; appraiser < trials.length; appraiser++) {
            for (int at = from[appraiser] + 1; at < from[appraiser + 1]; at++) {
                if (piece[at] == piece[at - 1] && trial[at] == trial[at - 1]) {
                    throw new IllegalArgumentException(
                            "Piece " + pieces.get(piece[at]).label() + ", appraiser " + appraisers.get(appraiser)
                                    + ", trial " + trial[at] + " is called twice");
                }
            }
        }
    }

    private static int[] starts(int appraisers, int[] appraiser, int calls) {
        int[] starts = new int[appraisers + 1];
        for (int at = 0; at < calls; at++) {
            starts[appraiser[at] + 1]++;
        }
        for (int next = 1; next <= appraisers; next++) {
            starts[next] += starts[next - 1];
        }
        return starts;
    }
}
