package org.levelgaze.database;

import java.sql.Connection;
import java.sql.SQLException;
import javax.sql.DataSource;
import org.springframework.boot.health.contributor.Health;
import org.springframework.boot.health.contributor.HealthIndicator;
import org.springframework.stereotype.Component;

/**
 * Whether the database answers. Stands in for Spring Boot's own, which waits for a connection even when our own
 * PostgreSQL has ended, and that is known at once.
 */
@Component
class DatabaseHealthIndicator implements HealthIndicator {

    private static final int SECONDS = 5;

    private final Database database;
    private final DataSource pool;

    DatabaseHealthIndicator(Database database, DataSource pool) {
        this.database = database;
        this.pool = pool;
    }

    @Override
    public Health health() {
        Health.Builder health = answers() ? Health.up() : Health.down();
        return health.withDetail("place", database.place()).build();
    }

    private boolean answers() {
        if (!database.alive()) {
            return false;
        }
        try (Connection connection = pool.getConnection()) {
            return connection.isValid(SECONDS);
        } catch (SQLException e) {
            return false;
        }
    }
}
