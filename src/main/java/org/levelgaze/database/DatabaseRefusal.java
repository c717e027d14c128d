package org.levelgaze.database;

/** The program does not serve on this database. Shown on the console as two sentences, without a stack trace. */
final class DatabaseRefusal extends RuntimeException {

    private static final long serialVersionUID = 1L;

    private final String wayOut;

    /**
     * A refusal to start.
     *
     * @param reason what is wrong, with the folder, address or setting it is about
     * @param wayOut what to do about it
     */
    DatabaseRefusal(String reason, String wayOut) {
        super(reason);
        this.wayOut = wayOut;
    }

    String wayOut() {
        return wayOut;
    }
}
