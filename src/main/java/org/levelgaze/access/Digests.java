package org.levelgaze.access;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;

/** SHA-256, under which secrets and requests are found again without being kept. */
final class Digests {

    private Digests() {}

    static byte[] sha256(String text) {
        return newSha256().digest(text.getBytes(StandardCharsets.UTF_8));
    }

    static MessageDigest newSha256() {
        try {
            return MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("Every Java platform has SHA-256", e);
        }
    }
}
