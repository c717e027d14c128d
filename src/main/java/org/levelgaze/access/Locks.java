package org.levelgaze.access;

import org.springframework.jdbc.core.RowCallbackHandler;
import org.springframework.jdbc.core.simple.JdbcClient;

/** Locks in the database for what may happen only once, on however many nodes the program runs. */
final class Locks {

    /** Held while the first account is made. */
    static final int FIRST_ACCOUNT = 1;

    /** Held while the first token is made. */
    static final int FIRST_TOKEN = 2;

    private static final int ACCESS = 20_270_102;

    private Locks() {}

    /** Waits for the lock, which is let go when the transaction ends. */
    static void takeUntilCommit(JdbcClient jdbc, int lock) {
        RowCallbackHandler nothing = row -> {};
        jdbc.sql("select pg_advisory_xact_lock(?, ?)").params(ACCESS, lock).query(nothing);
    }
}
