package org.levelgaze.database;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.util.List;

/** The folder in which our own PostgreSQL keeps the data. */
final class DataFolder {

    /** Read after all of {@code postgresql.conf}, so that a newer release can change it in an old folder. */
    private static final String OWN_SETTINGS = "levelgaze.conf";

    private static final String SETTINGS = """
            # Written by Levelgaze at each start; changes made here are lost.
            logging_collector = on
            log_directory = '../postgres-log'
            log_filename = 'postgres-%a.log'
            log_truncate_on_rotation = on
            log_rotation_age = 1d
            log_rotation_size = 0
            log_timezone = 'UTC'
            timezone = 'UTC'
            """;

    private DataFolder() {}

    /** Sets one up under a passing name and renames it when it is complete, so that no half one is ever taken for whole. */
    static void create(ServerCommands commands, String superuserPassword) {
        Home home = commands.home();
        Path passwordFile = home.folder().resolve("postgres-first-password");
        try {
            OwnerOnly.delete(home.unfinishedData());
            commands.user().takeOver(home.make(home.unfinishedData()));
            OwnerOnly.write(passwordFile, superuserPassword + "\n");
            commands.user().takeOver(passwordFile);
            initialise(commands, passwordFile);
            Files.writeString(
                    home.unfinishedData().resolve("postgresql.conf"),
                    "\ninclude_if_exists = '" + OWN_SETTINGS + "'\n",
                    StandardOpenOption.APPEND);
            Files.move(home.unfinishedData(), home.data(), StandardCopyOption.ATOMIC_MOVE);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        } finally {
            passwordFile.toFile().delete();
        }
    }

    private static void initialise(ServerCommands commands, Path passwordFile) {
        ServerCommands.Outcome outcome = commands.run(
                "initdb",
                List.of(
                        "--pgdata=" + commands.home().unfinishedData(),
                        "--username=" + OwnPostgres.SUPERUSER,
                        "--pwfile=" + passwordFile,
                        "--auth=scram-sha-256",
                        "--data-checksums",
                        "--encoding=UTF8",
                        "--locale=C",
                        "--locale-provider=builtin",
                        "--builtin-locale=C.UTF-8",
                        "--no-instructions"));
        if (!outcome.succeeded()) {
            throw new DatabaseRefusal(
                    "PostgreSQL cannot be set up in " + commands.home().folder() + " as "
                            + commands.user().words() + ": " + outcome.output(),
                    "Give LEVELGAZE_HOME a folder that this user can write to and go to, with 200 MB to spare.");
        }
    }

    /** Refuses a folder that these programs cannot serve, and gives it to the user that they run as. */
    static void prepare(ServerCommands commands) {
        Path data = commands.home().data();
        try {
            String version = Files.isRegularFile(data.resolve("PG_VERSION"))
                    ? Files.readString(data.resolve("PG_VERSION")).strip()
                    : "";
            refuseOther(data, version);
            Path settings = data.resolve(OWN_SETTINGS);
            if (!Files.exists(settings) || !Files.readString(settings).equals(SETTINGS)) {
                OwnerOnly.write(settings, SETTINGS);
            }
            commands.user().takeOver(settings);
            commands.user().takeOver(data);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static void refuseOther(Path data, String version) {
        if (version.isEmpty()) {
            throw new DatabaseRefusal(
                    "The folder " + data + " is not a PostgreSQL data folder: it holds no PG_VERSION.",
                    "Put the data back there, move the folder away to begin anew, or name another LEVELGAZE_HOME.");
        }
        if (!version.equals(Programs.MAJOR)) {
            throw new DatabaseRefusal(
                    "The data in " + data + " was written by PostgreSQL " + version
                            + "; this release brings PostgreSQL " + Programs.MAJOR + ", which cannot read it.",
                    "Start it with the Levelgaze release that wrote it, or serve the folder with a PostgreSQL "
                            + version + " of your own and name that server in SPRING_DATASOURCE_URL.");
        }
    }
}
