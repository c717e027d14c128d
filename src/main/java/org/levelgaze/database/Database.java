package org.levelgaze.database;

/** What the program stores in: its own PostgreSQL, or one that is named to it. */
sealed interface Database extends AutoCloseable permits OwnPostgres, JoinedPostgres, ExternalPostgres {

    /** How to reach it. */
    Access access();

    /** Whether the server still runs, as far as this program can know without asking it. */
    boolean alive();

    /** Where it is, for people. */
    String place();

    @Override
    void close();
}
