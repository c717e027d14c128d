package org.levelgaze.database;

import org.springframework.boot.health.contributor.Health;
import org.springframework.boot.health.contributor.HealthIndicator;
import org.springframework.stereotype.Component;

/** Says at once when our own PostgreSQL has ended, without waiting for a connection. */
@Component("postgres")
class DatabaseHealth implements HealthIndicator {

    private final Database database;

    DatabaseHealth(Database database) {
        this.database = database;
    }

    @Override
    public Health health() {
        Health.Builder health = database.alive() ? Health.up() : Health.down();
        return health.withDetail("place", database.place()).build();
    }
}
