package org.levelgaze.agreement;

/** Which way an appraiser's mistakes go. */
public enum Lean {
    /** Lets defects out. */
    LENIENT,
    /** Neither, as far as the calls show. */
    EVEN,
    /** Keeps good ones back. */
    STRICT
}
