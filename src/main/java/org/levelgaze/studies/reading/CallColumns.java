package org.levelgaze.studies.reading;

import java.util.Arrays;
import org.levelgaze.agreement.Call;
import org.levelgaze.agreement.Study;

/** Calls in columns of numbers: 14 bytes each, whatever their number. */
final class CallColumns {

    private int[] piece = new int[1024];
    private short[] appraiser = new short[1024];
    private int[] trial = new int[1024];
    private short[] seen = new short[1024];
    private boolean[] reject = new boolean[1024];
    private int size;
    private int highestTrial;

    void add(int onePiece, int oneAppraiser, int oneTrial, Call call, int seenKind) {
        if (size == piece.length) {
            grow(size + size / 2);
        }
        piece[size] = onePiece;
        appraiser[size] = (short) oneAppraiser;
        trial[size] = oneTrial;
        seen[size] = (short) seenKind;
        reject[size] = call == Call.REJECT;
        highestTrial = Math.max(highestTrial, oneTrial);
        size++;
    }

    int size() {
        return size;
    }

    int highestTrial() {
        return highestTrial;
    }

    void forEach(Study.CallVisitor visitor) {
        for (int at = 0; at < size; at++) {
            visitor.call(piece[at], appraiser[at], trial[at], reject[at] ? Call.REJECT : Call.ACCEPT, seen[at]);
        }
    }

    private void grow(int room) {
        piece = Arrays.copyOf(piece, room);
        appraiser = Arrays.copyOf(appraiser, room);
        trial = Arrays.copyOf(trial, room);
        seen = Arrays.copyOf(seen, room);
        reject = Arrays.copyOf(reject, room);
    }
}
