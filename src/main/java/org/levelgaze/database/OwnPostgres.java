package org.levelgaze.database;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.security.SecureRandom;
import java.sql.SQLException;
import java.util.Map;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;

/**
 * A PostgreSQL of the program's own: set up on the first start, started with the program and stopped after it. What it
 * acknowledged outlives the death of either.
 */
final class OwnPostgres implements Database {

    static final String SUPERUSER = "postgres";
    static final String OWNER = "levelgaze_owner";
    static final String DATABASE = "levelgaze";

    private static final Logger LOG = LoggerFactory.getLogger(OwnPostgres.class);

    private final HomeLock lock;
    private final Server server;
    private final Home home;
    private final Access access;

    private OwnPostgres(HomeLock lock, Server server, Home home, Access access) {
        this.lock = lock;
        this.server = server;
        this.home = home;
        this.access = access;
    }

    /** Starts it in this folder, as whom it can run here. */
    static OwnPostgres start(Path folder) {
        return start(folder, ServerUser.find(folder), Map.of());
    }

    /**
     * Starts it.
     *
     * @param folder the home folder
     * @param user as whom it runs
     * @param settings of the server, on top of ours
     */
    static OwnPostgres start(Path folder, ServerUser user, Map<String, String> settings) {
        Home home = Home.in(folder);
        HomeLock lock = HomeLock.take(home);
        try {
            Passwords passwords = home.holdsData() ? Passwords.read(home) : Passwords.create(home, new SecureRandom());
            ServerCommands commands = commands(home, user);
            if (!home.holdsData()) {
                LOG.info("First start: PostgreSQL is set up in {}", home.data());
                DataFolder.create(commands, passwords.superuser());
            }
            DataFolder.prepare(commands);
            Server server = Server.start(commands, settings);
            return opened(lock, server, home, passwords);
        } catch (RuntimeException e) {
            lock.close();
            throw e;
        }
    }

    private static ServerCommands commands(Home home, ServerUser user) {
        Path programs = Programs.unpack(home, Programs.archive());
        try {
            user.takeOver(home.make(home.logs()));
            user.takeOver(programs);
            if (user.isAnother()) {
                OwnerOnly.allow(home.folder(), "rwx--x--x");
                OwnerOnly.allow(home.programs(), "rwx--x--x");
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        ServerCommands commands = new ServerCommands(programs, user, home);
        if (!user.prefix().isEmpty()) {
            LOG.info("Started as root: PostgreSQL runs as {}", user.words());
        }
        return commands;
    }

    private static OwnPostgres opened(HomeLock lock, Server server, Home home, Passwords passwords) {
        String url = "jdbc:postgresql://127.0.0.1:" + server.port() + "/";
        Access access = new Access(
                url + DATABASE,
                url + DATABASE,
                new Login(OWNER, passwords.owner()),
                new Login(Access.APPLICATION_ROLE, passwords.application()),
                Access.APPLICATION_ROLE,
                false);
        try {
            Roles.create(url + "postgres", new Login(SUPERUSER, passwords.superuser()), access);
            Connections.use(access.url(), access.application(), Durability::demand);
            return new OwnPostgres(lock, server, home, access);
        } catch (SQLException e) {
            server.stop();
            throw new DatabaseRefusal(
                    "PostgreSQL in " + home.data() + " does not let the program in: " + e.getMessage() + ".",
                    "See whether " + home.passwords() + " belongs to this data, and look into " + home.logs() + ".");
        } catch (RuntimeException e) {
            server.stop();
            throw e;
        }
    }

    @Override
    public Access access() {
        return access;
    }

    @Override
    public boolean alive() {
        return server.alive();
    }

    @Override
    public String place() {
        return home.data().toString();
    }

    /** Stops the server, then lets another program have the folder. */
    @Override
    public void close() {
        server.stop();
        lock.close();
    }

    /** The server's process. */
    long pid() {
        return server.pid();
    }
}
