package org.levelgaze.testing;

import io.zonky.test.db.postgres.embedded.EmbeddedPostgres;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.Map;
import java.util.concurrent.atomic.AtomicInteger;
import org.flywaydb.core.Flyway;

/** One real PostgreSQL for all tests of a run; every context gets a copy of a migrated template database. */
public final class SharedPostgres {

    /** The role that owns the tables. */
    public static final String OWNER = "levelgaze_owner";

    /** The role the program works with. */
    public static final String APPLICATION = "levelgaze_app";

    private static final EmbeddedPostgres SERVER = start();
    private static final AtomicInteger COPIES = new AtomicInteger();

    private SharedPostgres() {}

    /** Makes a migrated, empty database and returns its JDBC address without a user. */
    public static String fresh() {
        String name = "t" + COPIES.incrementAndGet();
        asSuperuser("create database " + name + " template levelgaze_template strategy file_copy owner " + OWNER);
        return url(name);
    }

    /** Runs statements as the server's superuser, outside any test database. */
    public static void asSuperuser(String... statements) {
        try (Connection connection = SERVER.getPostgresDatabase().getConnection();
                Statement statement = connection.createStatement()) {
            for (String sql : statements) {
                statement.execute(sql);
            }
        } catch (SQLException e) {
            throw new IllegalStateException(e);
        }
    }

    /** A connection of the role that owns the tables, which can do what the program cannot. */
    public static Connection owner(String url) throws SQLException {
        return DriverManager.getConnection(url, OWNER, "owner");
    }

    private static String url(String database) {
        return "jdbc:postgresql://localhost:" + SERVER.getPort() + "/" + database;
    }

    private static EmbeddedPostgres start() {
        try {
            return EmbeddedPostgres.builder()
                    .setServerConfig("fsync", "off")
                    .setServerConfig("full_page_writes", "off")
                    .setServerConfig("timezone", "Pacific/Auckland")
                    .start();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    static {
        asSuperuser(
                "create role " + OWNER + " login password 'owner'",
                "create role " + APPLICATION + " login password 'app'",
                "create database levelgaze_template owner " + OWNER);
        Flyway.configure()
                .dataSource(url("levelgaze_template"), OWNER, "owner")
                .locations("classpath:db/migration")
                .placeholders(Map.of("appRole", APPLICATION))
                .load()
                .migrate();
    }
}
