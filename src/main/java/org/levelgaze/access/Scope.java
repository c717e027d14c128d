package org.levelgaze.access;

import java.util.Arrays;
import java.util.Optional;

/** What a token may do. */
public enum Scope {
    /** Read everything but true states. */
    READ("read"),
    /** Store facts. */
    WRITE("write"),
    /** Read true states; the reading is recorded. */
    KEY_READ("key:read"),
    /** Ask whether somebody may judge. */
    INTERLOCK("interlock"),
    /** Read the program's own measurements. */
    ADMIN("admin");

    private final String code;

    Scope(String code) {
        this.code = code;
    }

    /** The scope as it is written in the API's documentation. */
    public String code() {
        return code;
    }

    /** The scope with this code, if there is one. */
    static Optional<Scope> of(String code) {
        return Arrays.stream(values()).filter(scope -> scope.code.equals(code)).findFirst();
    }

    /** The name of the right that Spring Security checks. */
    String authority() {
        return "SCOPE_" + code;
    }
}
