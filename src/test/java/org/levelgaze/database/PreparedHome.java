package org.levelgaze.database;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.Map;
import java.util.stream.Stream;

/** A home folder after its first start, made once; tests work on copies, which spares them the set-up. */
final class PreparedHome {

    private static final Path ORIGINAL = make();

    private PreparedHome() {}

    /** A copy that no program has used yet. PostgreSQL's programs are shared by a link. */
    static Path copyTo(Path folder) throws IOException {
        try (Stream<Path> paths = Files.walk(ORIGINAL)) {
            for (Path path : paths.filter(each -> !each.startsWith(programs())).toList()) {
                Files.copy(
                        path,
                        folder.resolve(ORIGINAL.relativize(path).toString()),
                        StandardCopyOption.COPY_ATTRIBUTES,
                        StandardCopyOption.REPLACE_EXISTING);
            }
        }
        Files.createSymbolicLink(folder.resolve("postgres-program"), programs());
        return folder.toRealPath();
    }

    /** The folder right after its first start and stop. */
    static Path original() {
        return ORIGINAL;
    }

    private static Path programs() {
        return ORIGINAL.resolve("postgres-program");
    }

    private static Path make() {
        try {
            Path folder = Files.createTempDirectory("levelgaze-home");
            Runtime.getRuntime().addShutdownHook(new Thread(() -> delete(folder)));
            Path home = folder.resolve("home");
            OwnPostgres.start(home, ServerUser.find(home), Map.of()).close();
            return home.toRealPath();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static void delete(Path folder) {
        try {
            OwnerOnly.delete(folder);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
