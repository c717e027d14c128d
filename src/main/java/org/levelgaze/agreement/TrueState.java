package org.levelgaze.agreement;

/** What a piece really is, decided by those who hold the standard. A grey piece has none and is not scored. */
public enum TrueState {
    /** Fit to be released. */
    GOOD,
    /** Not fit to be released. */
    DEFECTIVE
}
