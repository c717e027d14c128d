package org.levelgaze.shared;

/**
 * Names one site; the leading column of every key that grows.
 *
 * @param value 1 or more
 */
public record SiteId(int value) {

    /** The site that exists from the start. */
    public static final SiteId MAIN = new SiteId(1);

    /** Refuses numbers below 1. */
    public SiteId {
        if (value < 1) {
            throw new IllegalArgumentException("A site's number is 1 or more, not " + value);
        }
    }
}
