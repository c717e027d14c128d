package org.levelgaze.studies.reading;

/** Watches a file being read, and may stop it. Asked every few thousand rows. */
@FunctionalInterface
public interface Watcher {

    /** Neither looks nor stops. */
    Watcher NONE = (rows, bytes) -> true;

    /**
     * Told how far the reading is.
     *
     * @param rows rows read below the header
     * @param bytes bytes read
     * @return whether to go on; {@code false} ends the reading with a {@link java.util.concurrent.CancellationException}
     */
    boolean goesOn(long rows, long bytes);
}
