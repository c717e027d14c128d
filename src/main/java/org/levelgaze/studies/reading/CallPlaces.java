package org.levelgaze.studies.reading;

/**
 * Remembers in which row each piece, appraiser and trial was called: an open hash table of packed numbers, so that a
 * million calls need no million objects. Free slots hold 0, which no packed number is, trials being 1 or more.
 */
final class CallPlaces {

    private static final int APPRAISER_BITS = 9;
    private static final int TRIAL_BITS = 20;

    private long[] keys = new long[1 << 11];
    private int[] rows = new int[1 << 11];
    private int size;

    /** Notes a call of this row, or answers the row in which the same was called before; 0 when it was not. */
    int note(int piece, int appraiser, int trial, int row) {
        if (size > keys.length / 2) {
            grow();
        }
        long key = ((long) piece << APPRAISER_BITS | appraiser) << TRIAL_BITS | trial;
        int slot = slotOf(key, keys);
        if (keys[slot] == key) {
            return rows[slot];
        }
        keys[slot] = key;
        rows[slot] = row;
        size++;
        return 0;
    }

    private static int slotOf(long key, long[] keys) {
        int slot = (int) ((key * 0x9E3779B97F4A7C15L) >>> 32) & (keys.length - 1);
        while (keys[slot] != 0 && keys[slot] != key) {
            slot = (slot + 1) & (keys.length - 1);
        }
        return slot;
    }

    private void grow() {
        long[] oldKeys = keys;
        int[] oldRows = rows;
        keys = new long[oldKeys.length * 2];
        rows = new int[keys.length];
        for (int at = 0; at < oldKeys.length; at++) {
            if (oldKeys[at] != 0) {
                int slot = slotOf(oldKeys[at], keys);
                keys[slot] = oldKeys[at];
                rows[slot] = oldRows[at];
            }
        }
    }
}
