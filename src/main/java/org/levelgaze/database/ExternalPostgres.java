package org.levelgaze.database;

import java.sql.Connection;
import java.sql.SQLException;
import org.jspecify.annotations.Nullable;

/**
 * A PostgreSQL that somebody else runs. Two logins are best: one owns the tables and migrates, the other works. With
 * one login alone it does both, and every connection of the pool changes to the application's role.
 *
 * @param access how to reach it
 */
record ExternalPostgres(Access access) implements Database {

    private static final int OLDEST = 15;

    /**
     * What the configuration says about it.
     *
     * @param url the JDBC address
     * @param login who signs in for the pool
     * @param ownerUrl the JDBC address for migrations; null: the same
     * @param owner who migrates; null: the same login
     * @param role the application's role; null: the login's, or {@link Access#APPLICATION_ROLE} with one login
     */
    record Named(
            String url,
            Login login,
            @Nullable String ownerUrl,
            @Nullable Login owner,
            @Nullable String role) {

        String address() {
            return withoutParameters(url);
        }
    }

    /** Looks at the server, and makes the application's role on it where one login does both and may do so. */
    static ExternalPostgres open(Named named) {
        boolean switches = named.owner() == null;
        String role = named.role();
        if (role == null) {
            role = switches ? Access.APPLICATION_ROLE : roleOf(named);
        }
        Login owner = named.owner() == null ? named.login() : named.owner();
        String ownerUrl = named.ownerUrl() == null ? named.url() : named.ownerUrl();
        Access access = new Access(named.url(), ownerUrl, owner, named.login(), role, switches);
        try (Connection connection = Connections.open(ownerUrl, owner)) {
            refuseOld(connection.getMetaData().getDatabaseMajorVersion(), withoutParameters(ownerUrl));
            demandRoomForTables(connection);
            if (switches) {
                makeRole(connection, access);
            }
            return new ExternalPostgres(access);
        } catch (SQLException e) {
            throw notLetIn(ownerUrl, owner, e);
        }
    }

    private static String roleOf(Named named) {
        try (Connection connection = Connections.open(named.url(), named.login())) {
            return Connections.text(connection, "select current_user");
        } catch (SQLException e) {
            throw notLetIn(named.url(), named.login(), e);
        }
    }

    private static DatabaseRefusal notLetIn(String url, Login login, SQLException why) {
        return new DatabaseRefusal(
                "The PostgreSQL at " + withoutParameters(url) + " does not let " + login.user() + " in: "
                        + why.getMessage(),
                "Check SPRING_DATASOURCE_URL, SPRING_DATASOURCE_USERNAME and SPRING_DATASOURCE_PASSWORD, and"
                        + " SPRING_FLYWAY_USER and SPRING_FLYWAY_PASSWORD where they are set.");
    }

    /** Refuses a server older than what the migrations are written for. */
    static void refuseOld(int major, String address) {
        if (major < OLDEST) {
            throw new DatabaseRefusal(
                    "The server at " + address + " is PostgreSQL " + major + "; Levelgaze needs " + OLDEST
                            + " or newer.",
                    "Name a newer server in SPRING_DATASOURCE_URL, or leave that out: Levelgaze then runs its own.");
        }
    }

    private static void demandRoomForTables(Connection connection) throws SQLException {
        if (!Connections.any(connection, "select where has_schema_privilege(current_schema(), 'create')")) {
            String login = Connections.text(connection, "select current_user");
            throw new DatabaseRefusal(
                    "The login " + login + " may not create tables in the database " + connection.getCatalog() + ".",
                    "Let an administrator run: alter database " + Access.quoted(connection.getCatalog()) + " owner to "
                            + Access.quoted(login) + ";");
        }
    }

    private static void makeRole(Connection connection, Access access) throws SQLException {
        String role = Access.quoted(access.role());
        String login = Access.quoted(Connections.text(connection, "select session_user"));
        if (canSwitch(connection, access)) {
            return;
        }
        try {
            if (!Connections.any(connection, "select from pg_roles where rolname = ?", access.role())) {
                Connections.execute(connection, "create role " + role + " nologin");
            }
            Connections.execute(connection, "grant " + role + " to " + login);
        } catch (SQLException e) {
            throw roleMissing(access, role, login);
        }
        if (!canSwitch(connection, access)) {
            throw roleMissing(access, role, login);
        }
    }

    private static boolean canSwitch(Connection connection, Access access) {
        try {
            Connections.execute(connection, access.roleStatement());
            Connections.execute(connection, "reset role");
            return true;
        } catch (SQLException e) {
            return false;
        }
    }

    private static DatabaseRefusal roleMissing(Access access, String role, String login) {
        return new DatabaseRefusal(
                "The login " + login + " cannot work as the role " + role + " at "
                        + withoutParameters(access.url())
                        + ", and without that the journal would not be safe from the program itself.",
                "Let an administrator run: create role " + role + " nologin; (if it is missing) and grant " + role
                        + " to " + login + "; or give the owner its own login in SPRING_FLYWAY_USER and"
                        + " SPRING_FLYWAY_PASSWORD.");
    }

    /** An address as it may be shown: parameters can hold a password. */
    private static String withoutParameters(String url) {
        return url.replaceFirst("\\?.*", "");
    }

    @Override
    public boolean alive() {
        return true;
    }

    @Override
    public String place() {
        return withoutParameters(access.url());
    }

    /** Nothing to stop: it is not ours. */
    @Override
    public void close() {}
}
