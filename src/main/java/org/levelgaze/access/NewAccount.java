package org.levelgaze.access;

import java.text.Normalizer;
import java.util.Locale;
import java.util.Set;
import java.util.regex.Pattern;
import org.levelgaze.shared.Refusal;

/**
 * An account to be made.
 *
 * @param loginName 1 to 100 letters, digits and marks of any script, without spaces
 * @param displayName the person's name on screen, 1 to 200 characters
 * @param password see {@link Passwords}
 * @param roles one or more
 * @param language the language of its pages
 */
public record NewAccount(String loginName, String displayName, String password, Set<Role> roles, Locale language) {

    private static final Pattern LOGIN_NAME = Pattern.compile("[\\p{L}\\p{M}\\p{N}\\p{P}\\p{S}]{1,100}");
    private static final Pattern DISPLAY_NAME = Pattern.compile("[^\\p{Cc}\\p{Cf}\\p{Cs}\\p{Cn}]{1,200}");

    /**
     * Strips spaces around the names and brings them to one form (NFC).
     *
     * @throws Refusal {@code login-name}, {@code display-name} or {@code no-role} when they cannot be taken
     */
    public NewAccount {
        loginName = Normalizer.normalize(loginName.strip(), Normalizer.Form.NFC);
        displayName = Normalizer.normalize(displayName.strip(), Normalizer.Form.NFC);
        roles = Set.copyOf(roles);
        if (!LOGIN_NAME.matcher(loginName).matches()) {
            throw new Refusal(Refusal.Kind.INVALID, "login-name");
        }
        if (!DISPLAY_NAME.matcher(displayName).matches()) {
            throw new Refusal(Refusal.Kind.INVALID, "display-name");
        }
        if (roles.isEmpty()) {
            throw new Refusal(Refusal.Kind.INVALID, "no-role");
        }
    }

    /** A login name in one case and one form of its letters, in which two that look alike are equal. */
    static String key(String loginName) {
        String form = Normalizer.normalize(loginName.strip(), Normalizer.Form.NFKC);
        String oneCase = form.toUpperCase(Locale.ROOT).toLowerCase(Locale.ROOT);
        return Normalizer.normalize(oneCase, Normalizer.Form.NFKC);
    }

    /** Never shows the password. */
    @Override
    public String toString() {
        return "NewAccount[" + roles + "]";
    }
}
