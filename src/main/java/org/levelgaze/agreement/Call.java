package org.levelgaze.agreement;

/** One judgement of one piece. */
public enum Call {
    /** The piece is let through. */
    ACCEPT,
    /** The piece is held back. */
    REJECT
}
