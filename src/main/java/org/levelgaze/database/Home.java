package org.levelgaze.database;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;

/**
 * The folder that holds everything an installation keeps.
 *
 * @param folder an absolute path without links, so that it can be compared with what PostgreSQL writes down
 */
record Home(Path folder) {

    /** The folder, made if it is missing, for its owner alone. */
    static Home in(Path folder) {
        try {
            OwnerOnly.createFolder(folder);
            return new Home(folder.toRealPath());
        } catch (IOException e) {
            throw new DatabaseRefusal(
                    "The folder " + folder.toAbsolutePath() + " cannot be made or opened: " + e + ".",
                    "Name a folder that this user can write to in LEVELGAZE_HOME.");
        }
    }

    Path data() {
        return folder.resolve("postgres");
    }

    /** Where a new data folder is made; it gets its name only when it is complete. */
    Path unfinishedData() {
        return folder.resolve("postgres.unfinished");
    }

    Path logs() {
        return folder.resolve("postgres-log");
    }

    Path programs() {
        return folder.resolve("postgres-program");
    }

    Path passwords() {
        return folder.resolve("postgres-passwords");
    }

    Path lock() {
        return folder.resolve("lock");
    }

    /** Makes a folder of its own for PostgreSQL. */
    Path make(Path subfolder) {
        try {
            OwnerOnly.createFolder(subfolder);
            return subfolder;
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** Whether PostgreSQL was set up here before. */
    boolean holdsData() {
        return Files.exists(data());
    }
}
