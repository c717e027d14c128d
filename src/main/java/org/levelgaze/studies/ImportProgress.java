package org.levelgaze.studies;

/** Is told how far an import is, and may stop it. */
public interface ImportProgress {

    /** Nobody watches. */
    ImportProgress UNWATCHED = (rows, bytes) -> true;

    /**
     * So far.
     *
     * @param rows rows read and stored
     * @param bytes bytes read
     * @return false to stop; nothing is stored then
     */
    boolean reached(long rows, long bytes);

    /** The user has stopped the import. */
    final class Cancelled extends RuntimeException {

        private static final long serialVersionUID = 1L;

        Cancelled() {
            super("The import was cancelled");
        }
    }
}
