package org.levelgaze.database;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.SQLException;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import javax.sql.DataSource;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.levelgaze.testing.SharedPostgres;
import org.springframework.beans.factory.DisposableBean;
import org.springframework.boot.autoconfigure.AutoConfigurations;
import org.springframework.boot.flyway.autoconfigure.FlywayAutoConfiguration;
import org.springframework.boot.health.contributor.Status;
import org.springframework.boot.jdbc.autoconfigure.DataSourceAutoConfiguration;
import org.springframework.boot.test.context.runner.ApplicationContextRunner;
import org.springframework.context.ApplicationContext;
import org.springframework.jdbc.core.simple.JdbcClient;

class DatabaseConfigurationTest {

    private static final String OWNERS = "select distinct tableowner::text from pg_tables where schemaname = 'public'";

    private final ApplicationContextRunner program = new ApplicationContextRunner()
            .withConfiguration(AutoConfigurations.of(DataSourceAutoConfiguration.class, FlywayAutoConfiguration.class))
            .withUserConfiguration(DatabaseConfiguration.class, ApplicationRole.class, DatabaseHealthIndicator.class);

    @Test
    void migratesAsTheOwnerWorksAsTheApplicationAndStopsPostgresLast(@TempDir Path folder) throws IOException {
        Path home = PreparedHome.copyTo(folder);
        List<String> lastAnswer = new ArrayList<>();
        program.withPropertyValues("levelgaze.home=" + home)
                .withBean(LastQuery.class, lastAnswer)
                .run(context -> {
                    assertThat(context).hasNotFailed();
                    assertThat(ask(context, OWNERS)).isEqualTo("levelgaze_owner");
                    assertThat(ask(context, "select current_user")).isEqualTo("levelgaze_app");
                    assertThat(context.getBean(DatabaseHealthIndicator.class)
                                    .health()
                                    .getStatus())
                            .isEqualTo(Status.UP);
                });

        assertThat(lastAnswer).as("asked while the context closes").containsExactly("MAIN");
        assertThat(home.resolve("postgres/postmaster.pid")).doesNotExist();
        Files.delete(home.resolve("postgres-program"));
    }

    @Test
    void isUnhealthyAtOnceWhenPostgresHasEnded(@TempDir Path folder) throws IOException {
        Path home = PreparedHome.copyTo(folder);
        program.withPropertyValues("levelgaze.home=" + home).run(context -> {
            DatabaseHealthIndicator health = context.getBean(DatabaseHealthIndicator.class);
            OwnPostgres postgres = (OwnPostgres) context.getBean(Database.class);
            ProcessHandle process = ProcessHandle.of(postgres.pid()).orElseThrow();
            assertThat(health.health().getStatus()).isEqualTo(Status.UP);

            process.destroyForcibly();
            process.onExit().join();

            long before = System.nanoTime();
            assertThat(health.health().getStatus()).isEqualTo(Status.DOWN);
            assertThat(Duration.ofNanos(System.nanoTime() - before)).isLessThan(Duration.ofSeconds(5));
        });
        Files.delete(home.resolve("postgres-program"));
    }

    @Test
    void takesTwoLoginsOfAServerThatSomebodyElseRuns() {
        external("levelgaze_app", "app", "spring.flyway.user=levelgaze_owner", "spring.flyway.password=owner")
                .run(context -> {
                    assertThat(context).hasNotFailed();
                    assertThat(ask(context, "select session_user || ' ' || current_user"))
                            .isEqualTo("levelgaze_app levelgaze_app");
                });
    }

    @Test
    void makesTheApplicationsRoleWhereOneLoginMayDoSo() {
        SharedPostgres.asSuperuser("create role one_for_all login createrole password 'one'");
        String url = emptyDatabase("one_login", "one_for_all");
        for (String start : List.of("first", "second")) {
            program.withPropertyValues(
                            "spring.datasource.url=" + url,
                            "spring.datasource.username=one_for_all",
                            "spring.datasource.password=one",
                            "spring.flyway.placeholders.appRole=one_for_all_app")
                    .run(context -> {
                        assertThat(context).as(start).hasNotFailed();
                        assertThat(ask(context, OWNERS)).isEqualTo("one_for_all");
                        assertThat(ask(context, "select session_user || ' ' || current_user"))
                                .isEqualTo("one_for_all one_for_all_app");
                    });
        }
    }

    @Test
    void saysWhatToRunWhereOneLoginMayNot() {
        SharedPostgres.asSuperuser("create role plain login password 'plain'");
        String url = emptyDatabase("plain_login", "plain");

        assertRefused(
                program.withPropertyValues(
                        "spring.datasource.url=" + url,
                        "spring.datasource.username=plain",
                        "spring.datasource.password=plain",
                        "spring.flyway.placeholders.appRole=plain_app"),
                "The login \"plain\" cannot work as the role \"plain_app\"",
                "create role \"plain_app\" nologin; (if it is missing) and grant \"plain_app\" to \"plain\";");
    }

    @Test
    void refusesALoginThatMayNotMakeTables() {
        SharedPostgres.asSuperuser("create role guest login password 'guest'");

        assertRefused(
                external("levelgaze_app", "app", "spring.flyway.user=guest", "spring.flyway.password=guest"),
                "The login guest may not create tables in the database t",
                "owner to \"guest\"");
    }

    @Test
    void refusesToWorkAsTheOwnerOfTheTables() {
        assertRefused(
                external(
                        "levelgaze_owner",
                        "owner",
                        "spring.flyway.user=levelgaze_owner",
                        "spring.flyway.password=owner"),
                "The role that the program would work as owns tables",
                "SPRING_FLYWAY_USER");
    }

    @Test
    void refusesToWorkAsASuperuser() {
        SharedPostgres.asSuperuser("create role almighty superuser login password 'all'");

        assertRefused(
                external("almighty", "all", "spring.flyway.user=levelgaze_owner", "spring.flyway.password=owner"),
                "The program would work as a superuser of the database.",
                "SPRING_DATASOURCE_USERNAME");
    }

    @Test
    void refusesToWorkAsARoleThatMayRewriteTheJournal() {
        SharedPostgres.asSuperuser("create role rewriter login password 're' in role levelgaze_app");
        String url = SharedPostgres.fresh();

        assertRefused(
                program.withPropertyValues(
                                "spring.datasource.url=" + url,
                                "spring.datasource.username=rewriter",
                                "spring.datasource.password=re",
                                "spring.flyway.user=levelgaze_owner",
                                "spring.flyway.password=owner")
                        .withInitializer(context -> grantOnJournal(url)),
                "may change or delete entries of the journal",
                "revoke update, delete, truncate, trigger on journal_entry");
    }

    @Test
    void namesTheAddressButNotItsParametersWhenNobodyAnswers() {
        assertRefused(
                program.withPropertyValues(
                        "spring.datasource.url=jdbc:postgresql://127.0.0.1:1/shop?password=secret",
                        "spring.datasource.username=somebody"),
                "The PostgreSQL at jdbc:postgresql://127.0.0.1:1/shop does not let somebody in",
                "SPRING_DATASOURCE_URL");
    }

    @Test
    void refusesAServerOlderThanItsMigrations() {
        ExternalPostgres.refuseOld(15, "somewhere");

        assertThatThrownBy(() -> ExternalPostgres.refuseOld(14, "somewhere"))
                .isInstanceOf(DatabaseRefusal.class)
                .hasMessage("The server at somewhere is PostgreSQL 14; Levelgaze needs 15 or newer.");
    }

    private ApplicationContextRunner external(String user, String password, String... more) {
        return program.withPropertyValues(
                        "spring.datasource.url=" + SharedPostgres.fresh(),
                        "spring.datasource.username=" + user,
                        "spring.datasource.password=" + password,
                        "spring.flyway.placeholders.appRole=levelgaze_app")
                .withPropertyValues(more);
    }

    private static String emptyDatabase(String name, String owner) {
        SharedPostgres.asSuperuser("create database " + name + " owner " + owner);
        return SharedPostgres.fresh().replaceFirst("/t\\d+$", "/" + name);
    }

    private static void grantOnJournal(String url) {
        try {
            Connections.use(
                    url,
                    new Login("levelgaze_owner", "owner"),
                    connection -> Connections.execute(connection, "grant delete on journal_entry to rewriter"));
        } catch (SQLException e) {
            throw new IllegalStateException(e);
        }
    }

    private static void assertRefused(ApplicationContextRunner program, String reason, String wayOut) {
        program.run(context -> {
            Throwable cause = Objects.requireNonNull(context.getStartupFailure());
            while (!(cause instanceof DatabaseRefusal)) {
                cause = Objects.requireNonNull(cause.getCause(), "no refusal but " + cause);
            }
            assertThat(cause).hasMessageContaining(reason);
            assertThat(((DatabaseRefusal) cause).wayOut()).contains(wayOut);
        });
    }

    private static String ask(ApplicationContext context, String sql) {
        return JdbcClient.create(context.getBean(DataSource.class))
                .sql(sql)
                .query(String.class)
                .single();
    }

    /** Asks once more when the context closes. */
    static final class LastQuery implements DisposableBean {

        private final DataSource pool;
        private final List<String> answers;

        LastQuery(DataSource pool, List<String> answers) {
            this.pool = pool;
            this.answers = answers;
        }

        @Override
        public void destroy() {
            answers.add(JdbcClient.create(pool)
                    .sql("select code from site")
                    .query(String.class)
                    .single());
        }
    }
}
