package org.levelgaze.database;

import java.sql.Connection;
import java.sql.SQLException;
import javax.sql.DataSource;
import org.springframework.beans.factory.SmartInitializingSingleton;
import org.springframework.stereotype.Component;

/** Looks, before the first request is answered, whether the role that the program works as could rewrite what it must not. */
@Component
class ApplicationRole implements SmartInitializingSingleton {

    private static final String WAY_OUT = "Name a login without these rights in SPRING_DATASOURCE_USERNAME, and the"
            + " owner of the tables in SPRING_FLYWAY_USER and SPRING_FLYWAY_PASSWORD.";

    private final DataSource pool;

    ApplicationRole(DataSource pool) {
        this.pool = pool;
    }

    @Override
    public void afterSingletonsInstantiated() {
        try (Connection connection = pool.getConnection()) {
            demand(connection);
        } catch (SQLException e) {
            throw new DatabaseRefusal(
                    "The database does not let the program in: " + e.getMessage() + ".",
                    "Check the address and the login of the database.");
        }
    }

    /** Refuses a role that owns tables, can become their owner, or may change the journal. */
    static void demand(Connection connection) throws SQLException {
        if (Connections.any(connection, "select from pg_roles where rolname = current_user and rolsuper")) {
            throw new DatabaseRefusal("The program would work as a superuser of the database.", WAY_OUT);
        }
        if (Connections.any(connection, """
                select from pg_class c join pg_namespace n on n.oid = c.relnamespace
                where c.relkind in ('r', 'p') and n.nspname not like 'pg\\_%' and n.nspname <> 'information_schema'
                  and pg_has_role(current_user, c.relowner, 'member')""")) {
            throw new DatabaseRefusal(
                    "The role that the program would work as owns tables, so it could undo their protection.", WAY_OUT);
        }
        if (Connections.any(connection, """
                select where to_regclass('journal_entry') is not null
                  and (has_table_privilege('journal_entry', 'update, delete, truncate, trigger')
                    or has_any_column_privilege('journal_entry', 'update'))""")) {
            throw new DatabaseRefusal(
                    "The role that the program would work as may change or delete entries of the journal.",
                    "Let the owner run: revoke update, delete, truncate, trigger on journal_entry from that role;"
                            + " it needs select and insert alone.");
        }
    }
}
