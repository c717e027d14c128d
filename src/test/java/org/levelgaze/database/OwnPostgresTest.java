package org.levelgaze.database;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assumptions.assumeThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.sql.Connection;
import java.sql.SQLException;
import java.time.Duration;
import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class OwnPostgresTest {

    @TempDir
    Path folder;

    Path home = Path.of("");

    @BeforeEach
    void prepare() throws IOException {
        home = PreparedHome.copyTo(folder);
    }

    @AfterEach
    void unlink() throws IOException {
        Files.delete(home.resolve("postgres-program"));
    }

    @Test
    void isForItsOwnerAlone() throws IOException {
        assertThat(rights(PreparedHome.original())).isEqualTo("rwx------");
        assertThat(rights(PreparedHome.original().resolve("postgres"))).isEqualTo("rwx------");
        assertThat(rights(PreparedHome.original().resolve("postgres-log"))).isEqualTo("rwx------");
        assertThat(rights(PreparedHome.original().resolve("postgres-passwords")))
                .isEqualTo("rw-------");
        assertThat(PreparedHome.original().resolve("postgres-first-password")).doesNotExist();
    }

    @Test
    void setsUpAnewWhatAFirstStartLeftUnfinished() throws IOException {
        Files.move(home.resolve("postgres"), home.resolve("postgres.unfinished"));
        Files.delete(home.resolve("postgres.unfinished/global/pg_control"));

        try (OwnPostgres postgres = OwnPostgres.start(home)) {
            assertThat(postgres.alive()).isTrue();
            assertThat(home.resolve("postgres.unfinished")).doesNotExist();
        }
    }

    @Test
    void listensOnTheLoopbackAddressAndAsksForAPassword() throws IOException, SQLException {
        try (OwnPostgres postgres = OwnPostgres.start(home)) {
            Access access = postgres.access();
            assertThat(ask(access, "show listen_addresses")).isEqualTo("127.0.0.1");
            assertThat(Files.readAllLines(home.resolve("postgres/postmaster.pid"))
                            .get(4))
                    .as("the folder of its socket")
                    .isEmpty();
            assertThat(ask(
                            access,
                            "select current_user || ' ' || datlocprovider::text || ' ' || datlocale"
                                    + " from pg_database where datname = current_database()"))
                    .isEqualTo("levelgaze_app b C.UTF-8");
            Login stranger = new Login(OwnPostgres.SUPERUSER, "guess");
            assertThatThrownBy(() -> Connections.use(access.url(), stranger, connection -> {}))
                    .hasMessageContaining("password authentication failed");
        }
    }

    @Test
    void keepsItsLogBesideTheData() {
        OwnPostgres.start(home).close();

        assertThat(home.resolve("postgres-log")).isDirectoryContaining("glob:**.log");
    }

    @Test
    void keepsWhatItAcknowledgedWhenTheProgramIsKilled() throws Exception {
        Process program = program();
        int acknowledged;
        try (var lines = program.inputReader()) {
            acknowledged = lines.lines()
                    .filter(line -> line.matches("\\d+"))
                    .mapToInt(Integer::parseInt)
                    .peek(number -> {
                        if (number == 200) {
                            program.toHandle().destroyForcibly();
                        }
                    })
                    .max()
                    .orElseThrow();
        }
        ProcessHandle orphan = postmaster();
        assertThat(orphan.isAlive()).as("PostgreSQL outlives its program").isTrue();

        try (OwnPostgres again = OwnPostgres.start(home)) {
            assertThat(orphan.onExit()).as("the one left over ends").succeedsWithin(Duration.ofSeconds(10));
            assertThat(again.pid()).isNotEqualTo(orphan.pid());
            assertThat(rows(again)).isGreaterThanOrEqualTo(acknowledged).isGreaterThanOrEqualTo(200);
        }
    }

    @Test
    void keepsWhatItAcknowledgedWhenPostgresIsKilled() throws Exception {
        AtomicInteger acknowledged = new AtomicInteger();
        OwnPostgres postgres = OwnPostgres.start(home);
        ProcessHandle process = postmaster();
        assertThatThrownBy(() -> Connections.use(
                        postgres.access().url(), postgres.access().owner(), connection -> {
                            CommittingProgram.createTable(connection);
                            while (true) {
                                CommittingProgram.insert(connection, acknowledged.incrementAndGet());
                                if (acknowledged.get() == 200) {
                                    process.destroyForcibly();
                                }
                            }
                        }))
                .isInstanceOf(SQLException.class);
        process.onExit().get(10, TimeUnit.SECONDS);
        assertThat(postgres.alive()).isFalse();
        postgres.close();

        try (OwnPostgres again = OwnPostgres.start(home)) {
            assertThat(rows(again))
                    .isGreaterThanOrEqualTo(acknowledged.get() - 1)
                    .isGreaterThanOrEqualTo(200);
        }
    }

    @Test
    void refusesASecondStartInTheSameFolder() {
        try (OwnPostgres first = OwnPostgres.start(home)) {
            assertThatThrownBy(() -> OwnPostgres.start(home))
                    .isInstanceOf(DatabaseRefusal.class)
                    .hasMessage("The folder " + home + " is in use by another Levelgaze (process "
                            + ProcessHandle.current().pid() + ").");
            assertThat(first.alive()).isTrue();
        }
    }

    @Test
    void saysOnTheConsoleWhyItDoesNotStart() throws Exception {
        try (OwnPostgres first = OwnPostgres.start(home)) {
            assertThat(first.alive()).isTrue();
            Process second = program();
            String said = new String(second.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
            assertThat(second.waitFor()).isEqualTo(1);
            assertThat(said)
                    .contains("The folder " + home + " is in use by another Levelgaze (process ")
                    .contains("or give this one a folder of its own in LEVELGAZE_HOME.")
                    .doesNotContain("\tat ");
        }
    }

    @Test
    void refusesDataOfAnotherMajorVersion() throws IOException {
        Files.writeString(home.resolve("postgres/PG_VERSION"), "16\n");

        assertThatThrownBy(() -> OwnPostgres.start(home))
                .isInstanceOf(DatabaseRefusal.class)
                .hasMessage("The data in " + home.resolve("postgres")
                        + " was written by PostgreSQL 16; this release brings PostgreSQL 17, which cannot read it.");
    }

    @Test
    void refusesAFolderThatHoldsOtherThings() throws IOException {
        Files.delete(home.resolve("postgres/PG_VERSION"));

        assertThatThrownBy(() -> OwnPostgres.start(home))
                .isInstanceOf(DatabaseRefusal.class)
                .hasMessageContaining("is not a PostgreSQL data folder");
    }

    @Test
    void refusesDataWhosePasswordsAreMissing() throws IOException {
        Files.delete(home.resolve("postgres-passwords"));

        assertThatThrownBy(() -> OwnPostgres.start(home))
                .isInstanceOf(DatabaseRefusal.class)
                .hasMessageContaining("postgres-passwords is missing or incomplete");
    }

    @Test
    void startsOverAPidFileWhoseNumberBelongsToAnotherProcessNow() throws IOException {
        Files.writeString(
                home.resolve("postgres/postmaster.pid"),
                ProcessHandle.current().pid() + "\n" + home.resolve("postgres") + "\n0\n5432\n\n127.0.0.1\n");

        try (OwnPostgres postgres = OwnPostgres.start(home)) {
            assertThat(postgres.alive()).isTrue();
        }
    }

    @Test
    void refusesToServeWithASettingThatLosesData() throws IOException {
        assertThatThrownBy(() -> OwnPostgres.start(home, ServerUser.find(home), Map.of("fsync", "off")))
                .isInstanceOf(DatabaseRefusal.class)
                .hasMessage("PostgreSQL runs with fsync = off: it could lose what it has acknowledged.");
        assertThat(home.resolve("postgres/postmaster.pid"))
                .as("it is stopped again")
                .doesNotExist();
    }

    @Test
    void refusesToServeARoleWhoseCommitsAreNotWaitedFor() throws SQLException {
        try (OwnPostgres postgres = OwnPostgres.start(home)) {
            Connections.use(
                    postgres.access().url(),
                    postgres.access().application(),
                    connection ->
                            Connections.execute(connection, "alter role levelgaze_app set synchronous_commit = off"));
        }

        assertThatThrownBy(() -> OwnPostgres.start(home))
                .isInstanceOf(DatabaseRefusal.class)
                .hasMessageContaining("synchronous_commit = off");
    }

    @Test
    void saysWhyItDoesNotStart() {
        assertThatThrownBy(() -> OwnPostgres.start(home, ServerUser.find(home), Map.of("hba_file", "missing.conf")))
                .isInstanceOf(DatabaseRefusal.class)
                .hasMessage("PostgreSQL does not start in " + home.resolve("postgres") + ": could not load "
                        + home.resolve("missing.conf") + ".");
    }

    @Test
    void refusesTheFolderOfAnotherUserWhenStartedAsRoot() throws IOException {
        assumeThat(ServerUser.startedAsRoot()).isTrue();
        ServerUser nobody = ServerUser.named("nobody").orElseThrow();
        Path another = Files.createDirectory(folder.resolve("another"));
        nobody.takeOver(another);

        assertThatThrownBy(() -> OwnPostgres.start(another))
                .isInstanceOf(DatabaseRefusal.class)
                .hasMessage(
                        "The folder " + another + " belongs to the user nobody, and Levelgaze was started as root.");
    }

    @Test
    void runsAsAnotherUserWhereRootHasNoNamespaceOfItsOwn() throws IOException, SQLException {
        assumeThat(ServerUser.startedAsRoot()).isTrue();
        ServerUser nobody = ServerUser.named("nobody").orElseThrow();
        OwnerOnly.allow(folder, "rwxr-xr-x");
        Path fresh = folder.resolve("another");

        try (OwnPostgres postgres = OwnPostgres.start(fresh, nobody, Map.of())) {
            assertThat(ask(postgres.access(), "select 1")).isEqualTo("1");
            assertThat(Files.getOwner(fresh.resolve("postgres")).getName()).isEqualTo("nobody");
        }
        try (OwnPostgres postgres = OwnPostgres.start(fresh)) {
            assertThat(postgres.alive()).as("and later in a namespace").isTrue();
        }
    }

    private Process program() throws IOException {
        return new ProcessBuilder(List.of(
                        Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                        "-XX:TieredStopAtLevel=1",
                        "-cp",
                        System.getProperty("java.class.path"),
                        CommittingProgram.class.getName(),
                        "--levelgaze.home=" + home))
                .redirectErrorStream(true)
                .start();
    }

    private ProcessHandle postmaster() {
        return PidFile.read(home.resolve("postgres"))
                .flatMap(file -> ProcessHandle.of(file.pid()))
                .orElseThrow();
    }

    private static int rows(OwnPostgres postgres) throws SQLException {
        Access access = postgres.access();
        return Integer.parseInt(ask(access.url(), access.owner(), "select count(*) from " + CommittingProgram.TABLE));
    }

    private static String ask(Access access, String sql) throws SQLException {
        return ask(access.url(), access.application(), sql);
    }

    private static String ask(String url, Login login, String sql) throws SQLException {
        try (Connection connection = Connections.open(url, login)) {
            return Connections.text(connection, sql);
        }
    }

    private static String rights(Path path) throws IOException {
        return PosixFilePermissions.toString(Files.getPosixFilePermissions(path));
    }
}
