package org.levelgaze.database;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;

/**
 * The PostgreSQL of another Levelgaze that runs on the same folder, used beside it by a command that only reads. It is left
 * running.
 *
 * @param access how to reach it
 * @param place its data folder
 */
record JoinedPostgres(Access access, String place) implements Database {

    /** The line of the pid file, from 0, that holds the port. */
    private static final int PORT = 3;

    /**
     * Joins the one that runs on this folder, or starts it when none does.
     *
     * @throws DatabaseRefusal when nothing is stored there
     */
    static Database orStart(Path folder) {
        Home home = Home.in(folder);
        if (!home.holdsData()) {
            throw new DatabaseRefusal(
                    "There is no database in " + home.folder() + ".",
                    "Name the folder that holds one in LEVELGAZE_HOME.");
        }
        return HomeLock.isFree(home) ? OwnPostgres.start(folder) : join(home);
    }

    private static Database join(Home home) {
        String url = "jdbc:postgresql://127.0.0.1:" + port(home) + "/" + OwnPostgres.DATABASE;
        Passwords passwords = Passwords.read(home);
        Access access = new Access(
                url,
                url,
                new Login(OwnPostgres.OWNER, passwords.owner()),
                new Login(Access.APPLICATION_ROLE, passwords.application()),
                Access.APPLICATION_ROLE,
                false);
        return new JoinedPostgres(access, home.data().toString());
    }

    private static int port(Home home) {
        try {
            List<String> lines = Files.readAllLines(PidFile.in(home.data()));
            return Integer.parseInt(lines.get(PORT).strip());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        } catch (IndexOutOfBoundsException | NumberFormatException e) {
            throw new DatabaseRefusal(
                    "The Levelgaze on " + home.folder() + " is only just starting.", "Try again in a moment.");
        }
    }

    @Override
    public boolean alive() {
        return true;
    }

    /** Nothing to end: it is another program's. */
    @Override
    public void close() {}
}
