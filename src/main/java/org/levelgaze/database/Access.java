package org.levelgaze.database;

/**
 * How the program reaches its database: the owner migrates, the application's role works.
 *
 * @param url the JDBC address for the pool
 * @param ownerUrl the JDBC address for migrations
 * @param owner owns the tables
 * @param application signs in for the pool
 * @param role the application's role, which the migrations grant to
 * @param switchesRole whether every connection of the pool changes to that role after signing in
 */
record Access(String url, String ownerUrl, Login owner, Login application, String role, boolean switchesRole) {

    /** The application's role where nobody names another one. */
    static final String APPLICATION_ROLE = "levelgaze_app";

    /** What a connection of the pool runs first. */
    String roleStatement() {
        return "set role " + quoted(role);
    }

    /** A name as it stands in a statement. */
    static String quoted(String name) {
        return '"' + name.replace("\"", "\"\"") + '"';
    }
}
