package org.levelgaze.studies.importing;

import java.io.InputStream;
import org.jspecify.annotations.Nullable;

/** Reads parts one after the other as one stream; holds one part at a time. */
final class PartStream extends InputStream {

    /** Gives the bytes of a part; null after the last. */
    @FunctionalInterface
    interface Parts {

        byte @Nullable [] part(int number);
    }

    private final Parts parts;
    private byte @Nullable [] current;
    private int at;
    private int next;

    PartStream(Parts parts) {
        this.parts = parts;
        this.current = parts.part(next++);
    }

    @Override
    public int read() {
        byte[] one = new byte[1];
        return read(one, 0, 1) == -1 ? -1 : one[0] & 0xff;
    }

    @Override
    public int read(byte[] target, int offset, int length) {
        if (length == 0) {
            return 0;
        }
        while (current != null && at == current.length) {
            current = parts.part(next++);
            at = 0;
        }
        if (current == null) {
            return -1;
        }
        int taken = Math.min(length, current.length - at);
        System.arraycopy(current, at, target, offset, taken);
        at += taken;
        return taken;
    }
}
