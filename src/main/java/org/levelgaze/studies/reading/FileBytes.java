package org.levelgaze.studies.reading;

import java.io.FilterInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

/** Counts and digests the bytes of a file as they pass, and stops where there are too many. */
final class FileBytes extends FilterInputStream {

    private final MessageDigest digest;
    private final long limit;
    private long count;

    FileBytes(InputStream file, long limit) {
        super(file);
        this.limit = limit;
        try {
            digest = MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("Every Java platform has SHA-256", e);
        }
    }

    long count() {
        return count;
    }

    String sha256() {
        return HexFormat.of().formatHex(digest.digest());
    }

    @Override
    public int read() throws IOException {
        byte[] one = new byte[1];
        return read(one, 0, 1) < 0 ? -1 : one[0] & 0xFF;
    }

    @Override
    public int read(byte[] into, int offset, int length) throws IOException {
        int got = super.read(into, offset, length);
        if (got > 0) {
            count += got;
            digest.update(into, offset, got);
            CallFile.refuseAbove(limit, count, "file-too-large");
        }
        return got;
    }
}
