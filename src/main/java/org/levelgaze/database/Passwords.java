package org.levelgaze.database;

import java.io.IOException;
import java.io.Reader;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.security.SecureRandom;
import java.util.Base64;
import java.util.Properties;
import java.util.stream.Stream;

/**
 * The passwords of our own PostgreSQL, made once and kept in a file that only its owner may read.
 *
 * @param superuser sets up roles and the database
 * @param owner migrates
 * @param application works
 */
record Passwords(String superuser, String owner, String application) {

    private static final int BYTES = 24;

    /** Makes three and keeps them. */
    static Passwords create(Home home, SecureRandom random) {
        Passwords made = new Passwords(any(random), any(random), any(random));
        try {
            OwnerOnly.write(
                    home.passwords(),
                    "superuser=" + made.superuser + "\nowner=" + made.owner + "\napplication=" + made.application
                            + "\n");
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return made;
    }

    /** Reads those that were kept. */
    static Passwords read(Home home) {
        Properties kept = new Properties();
        try (Reader reader = Files.newBufferedReader(home.passwords())) {
            kept.load(reader);
        } catch (IOException e) {
            throw unreadable(home);
        }
        if (!Stream.of("superuser", "owner", "application").allMatch(kept::containsKey)) {
            throw unreadable(home);
        }
        return new Passwords(kept.getProperty("superuser"), kept.getProperty("owner"), kept.getProperty("application"));
    }

    private static DatabaseRefusal unreadable(Home home) {
        return new DatabaseRefusal(
                "The file " + home.passwords() + " is missing or incomplete, and without it the data in " + home.data()
                        + " cannot be opened.",
                "Put the file back from the backup of the folder " + home.folder()
                        + "; it belongs to the data beside it.");
    }

    private static String any(SecureRandom random) {
        byte[] bytes = new byte[BYTES];
        random.nextBytes(bytes);
        return Base64.getUrlEncoder().withoutPadding().encodeToString(bytes);
    }

    @Override
    public String toString() {
        return "Passwords[…]";
    }
}
