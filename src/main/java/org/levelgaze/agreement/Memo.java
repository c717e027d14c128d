package org.levelgaze.agreement;

import java.util.concurrent.atomic.AtomicReferenceArray;
import org.jspecify.annotations.Nullable;

/**
 * Remembers results of costly functions of a few counts and a level: bounded, safe for many threads, without locks. A
 * newer result takes the place of an older one that falls into the same slot.
 *
 * @param <T> the results, immutable
 */
final class Memo<T> {

    private record Entry<T>(long a, long b, long c, long d, double level, T result) {

        boolean isOf(long otherA, long otherB, long otherC, long otherD, double otherLevel) {
            return a == otherA && b == otherB && c == otherC && d == otherD && level == otherLevel;
        }
    }

    private final AtomicReferenceArray<@Nullable Entry<T>> slots;

    /** A memo of this many slots, a power of two. */
    Memo(int slots) {
        this.slots = new AtomicReferenceArray<>(slots);
    }

    @Nullable
    T find(long a, long b, long c, long d, double level) {
        Entry<T> entry = slots.get(slot(a, b, c, d, level));
        return entry != null && entry.isOf(a, b, c, d, level) ? entry.result() : null;
    }

    /** Keeps the result and gives it back. */
    T keep(long a, long b, long c, long d, double level, T result) {
        slots.set(slot(a, b, c, d, level), new Entry<>(a, b, c, d, level, result));
        return result;
    }

    private int slot(long a, long b, long c, long d, double level) {
        long mixed = Double.doubleToLongBits(level);
        mixed = mixed * 31 + a;
        mixed = mixed * 0x9E3779B97F4A7C15L + b;
        mixed = mixed * 0x9E3779B97F4A7C15L + c;
        mixed = mixed * 0x9E3779B97F4A7C15L + d;
        mixed *= 0x9E3779B97F4A7C15L;
        return (int) (mixed >>> 32) & (slots.length() - 1);
    }
}
