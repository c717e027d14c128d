package org.levelgaze.access;

import java.nio.charset.StandardCharsets;
import java.text.Normalizer;
import org.jspecify.annotations.Nullable;
import org.levelgaze.shared.Refusal;
import org.springframework.security.crypto.factory.PasswordEncoderFactories;
import org.springframework.security.crypto.password.PasswordEncoder;
import org.springframework.stereotype.Component;

/**
 * Hashes and checks passwords. A password has 12 characters or more and at most 72 bytes in UTF-8, all that bcrypt looks
 * at. The same letters typed on another keyboard count as the same (NFC).
 */
@Component
class Passwords {

    static final int MIN_CHARACTERS = 12;
    static final int MAX_BYTES = 72;

    private final PasswordEncoder encoder = PasswordEncoderFactories.createDelegatingPasswordEncoder();
    private final String nobodys = hashOf("a password that nobody has");

    /**
     * The hash of a new password.
     *
     * @throws Refusal {@code password-too-short} or {@code password-too-long}
     */
    String hash(String password) {
        String form = form(password);
        if (form.codePointCount(0, form.length()) < MIN_CHARACTERS) {
            throw new Refusal(Refusal.Kind.INVALID, "password-too-short", MIN_CHARACTERS);
        }
        if (isTooLong(form)) {
            throw new Refusal(Refusal.Kind.INVALID, "password-too-long", MAX_BYTES);
        }
        return hashOf(form);
    }

    /** Whether the password is the one that was hashed. Takes as long when there is no hash to compare with. */
    boolean matches(String password, @Nullable String hash) {
        if (isTooLong(password) || isTooLong(form(password))) {
            encoder.matches("", nobodys);
            return false;
        }
        boolean equal = encoder.matches(form(password), hash == null ? nobodys : hash);
        return equal && hash != null;
    }

    private String hashOf(String password) {
        String hash = encoder.encode(password);
        if (hash == null) {
            throw new IllegalStateException("No password, no hash");
        }
        return hash;
    }

    /** Counts characters first: a password of megabytes is not even encoded. */
    private static boolean isTooLong(String password) {
        return password.length() > MAX_BYTES * 4 || password.getBytes(StandardCharsets.UTF_8).length > MAX_BYTES;
    }

    private static String form(String password) {
        return password.length() > MAX_BYTES * 4 ? password : Normalizer.normalize(password, Normalizer.Form.NFC);
    }
}
