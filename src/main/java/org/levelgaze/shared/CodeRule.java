package org.levelgaze.shared;

import java.util.regex.Pattern;

/** What can be a code of the site's own: kept exactly as written, but printable, and usable in an address. */
public final class CodeRule {

    /** The most characters of a code. */
    public static final int LONGEST = 100;

    /** Control characters, and what would mean something else in an address: a parameter, or a place. */
    private static final Pattern NOT_USABLE = Pattern.compile("\\p{Cntrl}|;|^\\.{1,2}$");

    private CodeRule() {}

    /** Whether the text can be a code. */
    public static boolean isUsable(String code) {
        return !code.isBlank()
                && code.length() <= LONGEST
                && !NOT_USABLE.matcher(code).find();
    }
}
