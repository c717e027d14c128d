package org.levelgaze.register;

import java.util.Set;
import java.util.regex.Pattern;
import org.levelgaze.shared.Refusal;

/** The rules for codes and names: kept exactly as written, but they must be printable. */
final class Codes {

    static final int LONGEST_CODE = 100;
    static final int LONGEST_NAME = 200;

    private static final Pattern CONTROL = Pattern.compile("\\p{Cntrl}");

    /** They mean a place in an address, not a thing. */
    private static final Set<String> NO_ADDRESS = Set.of(".", "..");

    /** What follows it in an address is a parameter. */
    private static final String ENDS_AN_ADDRESS = ";";

    private Codes() {}

    static void check(String thing, String code) {
        if (code.isBlank()
                || NO_ADDRESS.contains(code)
                || code.contains(ENDS_AN_ADDRESS)
                || code.length() > LONGEST_CODE
                || CONTROL.matcher(code).find()) {
            throw new Refusal(Refusal.Kind.INVALID, "code-not-usable", thing, code, LONGEST_CODE);
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
