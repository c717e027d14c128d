package org.levelgaze.database;

import java.sql.Connection;
import java.sql.SQLException;
import java.util.List;

/** What must be switched on, in the sessions that store, for a commit to outlive a crash. */
final class Durability {

    static final List<String> SETTINGS = List.of("fsync", "synchronous_commit", "full_page_writes", "data_checksums");

    private Durability() {}

    /** Asks the server and refuses one that could lose what it acknowledged. */
    static void demand(Connection connection) throws SQLException {
        for (String setting : SETTINGS) {
            demand(connection, setting);
        }
    }

    static void demand(Connection connection, String setting) throws SQLException {
        String value = Connections.text(connection, "show " + setting);
        if (!value.equals("on")) {
            throw new DatabaseRefusal(
                    "PostgreSQL runs with " + setting + " = " + value + ": it could lose what it has acknowledged.",
                    setting.equals("data_checksums")
                            ? "Switch data_checksums on with pg_checksums while the program is stopped."
                            : "Switch " + setting
                                    + " on; look for it in the settings of the server, its roles and its databases.");
        }
    }
}
