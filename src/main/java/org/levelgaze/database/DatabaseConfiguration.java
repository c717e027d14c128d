package org.levelgaze.database;

import com.zaxxer.hikari.HikariDataSource;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.springframework.beans.factory.ObjectProvider;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.beans.factory.config.BeanPostProcessor;
import org.springframework.boot.flyway.autoconfigure.FlywayConfigurationCustomizer;
import org.springframework.boot.flyway.autoconfigure.FlywayConnectionDetails;
import org.springframework.boot.jdbc.autoconfigure.JdbcConnectionDetails;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.core.env.Environment;

/**
 * First the server, then the migrations as the owner of the tables, then the pool as the application's role; at the end
 * the other way round. Spring keeps that order, since pool and migrations ask for their addresses here.
 */
@Configuration(proxyBeanMethods = false)
class DatabaseConfiguration {

    private static final String ROLE = "appRole";

    @Bean
    Database database(
            Environment environment,
            @Value("${levelgaze.home:levelgaze-data}") Path home,
            @Value("${levelgaze.database.join:false}") boolean join) {
        String url = environment.getProperty("spring.datasource.url");
        if (url != null && !url.isBlank()) {
            return ExternalPostgres.open(named(environment, url));
        }
        return join ? JoinedPostgres.orStart(home) : OwnPostgres.start(home);
    }

    private static ExternalPostgres.Named named(Environment environment, String url) {
        String owner = environment.getProperty("spring.flyway.user");
        return new ExternalPostgres.Named(
                url,
                new Login(
                        environment.getProperty("spring.datasource.username"),
                        environment.getProperty("spring.datasource.password")),
                environment.getProperty("spring.flyway.url"),
                owner == null ? null : new Login(owner, environment.getProperty("spring.flyway.password")),
                environment.getProperty("spring.flyway.placeholders." + ROLE));
    }

    @Bean
    JdbcConnectionDetails poolConnection(Database database) {
        return new PoolConnection(database.access());
    }

    @Bean
    FlywayConnectionDetails migrationConnection(Database database) {
        return new MigrationConnection(database.access());
    }

    @Bean
    FlywayConfigurationCustomizer roleForMigrations(Database database) {
        return configuration -> {
            Map<String, String> placeholders = new HashMap<>(configuration.getPlaceholders());
            placeholders.put(ROLE, database.access().role());
            configuration.placeholders(placeholders);
        };
    }

    /** With one login for everything, every connection of the pool changes to the application's role. */
    @Bean
    static BeanPostProcessor roleForPool(ObjectProvider<Database> database) {
        return new BeanPostProcessor() {
            @Override
            public Object postProcessBeforeInitialization(Object bean, String name) {
                if (bean instanceof HikariDataSource pool
                        && database.getObject().access().switchesRole()) {
                    pool.setConnectionInitSql(database.getObject().access().roleStatement());
                }
                return bean;
            }
        };
    }

    private record PoolConnection(Access access) implements JdbcConnectionDetails {

        @Override
        public @Nullable String getUsername() {
            return access.application().user();
        }

        @Override
        public @Nullable String getPassword() {
            return access.application().password();
        }

        @Override
        public String getJdbcUrl() {
            return access.url();
        }
    }

    private record MigrationConnection(Access access) implements FlywayConnectionDetails {

        @Override
        public @Nullable String getUsername() {
            return access.owner().user();
        }

        @Override
        public @Nullable String getPassword() {
            return access.owner().password();
        }

        @Override
        public String getJdbcUrl() {
            return access.ownerUrl();
        }
    }
}
