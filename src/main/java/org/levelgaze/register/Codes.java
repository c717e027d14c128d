package org.levelgaze.register;

import java.util.regex.Pattern;
import org.levelgaze.shared.CodeRule;
import org.levelgaze.shared.Refusal;

/** The rules for codes and names: kept exactly as written, but they must be printable. */
final class Codes {

    static final int LONGEST_NAME = 200;

    private static final Pattern CONTROL = Pattern.compile("\\p{Cntrl}");

    private Codes() {}

    static void check(String thing, String code) {
        if (!CodeRule.isUsable(code)) {
            throw new Refusal(Refusal.Kind.INVALID, "code-not-usable", thing, code, CodeRule.LONGEST);
        }
    }

    static void checkName(String name) {
        if (name.isBlank()
                || name.length() > LONGEST_NAME
                || CONTROL.matcher(name).find()) {
            throw new Refusal(Refusal.Kind.INVALID, "name-not-usable", name, LONGEST_NAME);
        }
    }
}
