package org.levelgaze.database;

import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.Properties;
import org.jspecify.annotations.Nullable;

/** Single connections for what must be known or done before there is a pool. */
final class Connections {

    private Connections() {}

    /** Something to do with a connection. */
    @FunctionalInterface
    interface Work {
        void with(Connection connection) throws SQLException;
    }

    static void use(String url, Login login, Work work) throws SQLException {
        try (Connection connection = open(url, login)) {
            work.with(connection);
        }
    }

    /** A connection for the caller to close. */
    static Connection open(String url, Login login) throws SQLException {
        Properties properties = new Properties();
        if (login.user() != null) {
            properties.setProperty("user", login.user());
        }
        if (login.password() != null) {
            properties.setProperty("password", login.password());
        }
        return DriverManager.getConnection(url, properties);
    }

    /** Whether a query over these parameters has a row. */
    static boolean any(Connection connection, String sql, @Nullable String... parameters) throws SQLException {
        try (PreparedStatement statement = connection.prepareStatement(sql)) {
            for (int i = 0; i < parameters.length; i++) {
                statement.setString(i + 1, parameters[i]);
            }
            try (ResultSet rows = statement.executeQuery()) {
                return rows.next();
            }
        }
    }

    /** The first column of a query's first row. */
    static String text(Connection connection, String sql) throws SQLException {
        try (Statement statement = connection.createStatement();
                ResultSet answer = statement.executeQuery(sql)) {
            answer.next();
            return answer.getString(1);
        }
    }

    static void execute(Connection connection, String sql) throws SQLException {
        try (Statement statement = connection.createStatement()) {
            statement.execute(sql);
        }
    }
}
