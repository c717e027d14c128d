package org.levelgaze.database;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.FileSystems;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.nio.file.attribute.UserPrincipal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;

/**
 * As whom PostgreSQL runs: it refuses to run as root.
 *
 * @param prefix what stands before each of its commands
 * @param owner who must own its files; null when nothing is to be changed
 * @param words how to say it
 */
record ServerUser(List<String> prefix, @Nullable UserPrincipal owner, String words) {

    /** Tried in this order when root can use no user namespace. */
    private static final List<String> ORDINARY_USERS = List.of("levelgaze", "postgres", "nobody");

    /** The way that works here, for a home folder that may be there already. */
    static ServerUser find(Path home) {
        if (!startedAsRoot()) {
            return new ServerUser(List.of(), null, "this user");
        }
        refuseFolderOfAnother(home);
        return inNamespace()
                .or(() -> ORDINARY_USERS.stream()
                        .flatMap(name -> named(name).stream())
                        .findFirst())
                .orElseThrow(() -> new DatabaseRefusal(
                        "Levelgaze was started as root, PostgreSQL does not run as root, and neither a user namespace"
                                + " (unshare) nor another user (setpriv) can be used here.",
                        "Start Levelgaze as an ordinary user, or name a PostgreSQL server in SPRING_DATASOURCE_URL."));
    }

    /** Root would leave files behind that the folder's own user cannot open any more. */
    private static void refuseFolderOfAnother(Path home) {
        try {
            if (Files.exists(home) && !Files.getOwner(home).equals(principal("root"))) {
                String user = Files.getOwner(home).getName();
                throw new DatabaseRefusal(
                        "The folder " + home.toAbsolutePath() + " belongs to the user " + user
                                + ", and Levelgaze was started as root.",
                        "Start it as " + user + ", give the folder to root, or name another one in LEVELGAZE_HOME.");
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    static boolean startedAsRoot() {
        return FileSystems.getDefault().supportedFileAttributeViews().contains("unix")
                && answer(List.of("id", "-u")).filter("0"::equals).isPresent();
    }

    /** A namespace in which root is nobody in particular; the files stay root's. */
    static Optional<ServerUser> inNamespace() {
        List<String> prefix = List.of("unshare", "--user", "--");
        return answer(with(prefix, "id", "-u"))
                .filter(uid -> !uid.equals("0"))
                .map(uid -> new ServerUser(prefix, principal("root"), "root in a user namespace of its own"));
    }

    /** Another user of this machine; the files become that user's. */
    static Optional<ServerUser> named(String name) {
        Optional<String> uid = answer(List.of("id", "-u", name));
        Optional<String> gid = answer(List.of("id", "-g", name));
        if (uid.isEmpty() || gid.isEmpty()) {
            return Optional.empty();
        }
        List<String> prefix =
                List.of("setpriv", "--reuid=" + uid.get(), "--regid=" + gid.get(), "--clear-groups", "--");
        return answer(with(prefix, "id", "-u"))
                .filter(uid.get()::equals)
                .map(same -> new ServerUser(prefix, principal(name), "the user " + name));
    }

    /** The command with what must stand before it. */
    List<String> wrap(List<String> command) {
        return with(prefix, command.toArray(String[]::new));
    }

    /** Whether that user must be let through folders that belong to the one who started the program. */
    boolean isAnother() {
        return owner != null && !owner.getName().equals("root");
    }

    /** Gives a file, or a folder with all that is in it, to the user that PostgreSQL runs as. */
    void takeOver(Path path) throws IOException {
        if (owner == null || owner.equals(Files.getOwner(path, LinkOption.NOFOLLOW_LINKS))) {
            return;
        }
        try (Stream<Path> paths = Files.walk(path)) {
            for (Path each : paths.toList()) {
                Files.setAttribute(each, "posix:owner", owner, LinkOption.NOFOLLOW_LINKS);
            }
        }
    }

    private static List<String> with(List<String> prefix, String... command) {
        List<String> whole = new ArrayList<>(prefix);
        whole.addAll(List.of(command));
        return List.copyOf(whole);
    }

    private static UserPrincipal principal(String name) {
        try {
            return FileSystems.getDefault().getUserPrincipalLookupService().lookupPrincipalByName(name);
        } catch (IOException e) {
            throw new IllegalStateException("No user " + name, e);
        }
    }

    /** The first line a command prints; none when it is missing or fails. */
    private static Optional<String> answer(List<String> command) {
        try {
            Process process = new ProcessBuilder(command)
                    .redirectError(ProcessBuilder.Redirect.DISCARD)
                    .start();
            String line = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
            return process.waitFor() == 0 ? Optional.of(line.strip()) : Optional.empty();
        } catch (IOException e) {
            return Optional.empty();
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            return Optional.empty();
        }
    }
}
