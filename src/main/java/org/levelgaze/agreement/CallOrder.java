package org.levelgaze.agreement;

/** The order of calls by appraiser, piece and trial: a radix sort, in time and memory that grow with the calls alone. */
final class CallOrder {

    private static final int DIGIT = 11;
    private static final int DIGITS = 1 << DIGIT;

    private CallOrder() {}

    /** Which call stands first, second, ... */
    static int[] of(int calls, int[] appraiser, int[] piece, int[] trial) {
        int[] order = new int[calls];
        for (int at = 0; at < calls; at++) {
            order[at] = at;
        }
        order = sorted(order, trial);
        order = sorted(order, piece);
        return sorted(order, appraiser);
    }

    static int[] arranged(int[] column, int[] order) {
        int[] arranged = new int[order.length];
        for (int at = 0; at < order.length; at++) {
            arranged[at] = column[order[at]];
        }
        return arranged;
    }

    static byte[] arranged(byte[] column, int[] order) {
        byte[] arranged = new byte[order.length];
        for (int at = 0; at < order.length; at++) {
            arranged[at] = column[order[at]];
        }
        return arranged;
    }

    private static int[] sorted(int[] order, int[] column) {
        int highest = 0;
        for (int at : order) {
            highest = Math.max(highest, column[at]);
        }
        int[] sorted = order;
        for (int shift = 0; shift < Integer.SIZE && highest >>> shift > 0; shift += DIGIT) {
            sorted = sortedByDigit(sorted, column, shift);
        }
        return sorted;
    }

    /** One stable pass over one digit. */
    private static int[] sortedByDigit(int[] order, int[] column, int shift) {
        int[] next = new int[DIGITS + 1];
        for (int at : order) {
            next[(column[at] >>> shift & DIGITS - 1) + 1]++;
        }
        for (int digit = 1; digit <= DIGITS; digit++) {
            next[digit] += next[digit - 1];
        }
        int[] sorted = new int[order.length];
        for (int at : order) {
            sorted[next[column[at] >>> shift & DIGITS - 1]++] = at;
        }
        return sorted;
    }
}
