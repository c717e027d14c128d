package org.levelgaze.database;

import java.sql.Connection;
import java.sql.SQLException;

/** The roles and the database of our own PostgreSQL; made when they are missing, so that a first start cut short is finished by the next. */
final class Roles {

    private Roles() {}

    static void create(String url, Login superuser, Access access) throws SQLException {
        Connections.use(url, superuser, connection -> {
            createRole(connection, access.owner());
            createRole(connection, access.application());
            if (!Connections.any(connection, "select from pg_database where datname = ?", OwnPostgres.DATABASE)) {
                Connections.execute(
                        connection, "create database " + OwnPostgres.DATABASE + " owner " + OwnPostgres.OWNER);
            }
            Connections.execute(connection, "revoke all on database " + OwnPostgres.DATABASE + " from public");
            Connections.execute(
                    connection,
                    "grant connect, temporary on database " + OwnPostgres.DATABASE + " to " + access.role());
        });
    }

    private static void createRole(Connection connection, Login login) throws SQLException {
        if (!Connections.any(connection, "select from pg_roles where rolname = ?", login.user())) {
            // the password is ours, of the letters of base64url: nothing to escape
            Connections.execute(
                    connection, "create role " + login.user() + " login password '" + login.password() + "'");
        }
    }
}
