package org.levelgaze.database;

import java.io.IOException;
import java.nio.file.FileSystems;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.stream.Stream;

/** Files and folders that nobody but their owner may open. Where a file system knows no such rights, they are made without. */
final class OwnerOnly {

    private static final boolean POSIX =
            FileSystems.getDefault().supportedFileAttributeViews().contains("posix");

    private OwnerOnly() {}

    static void createFolder(Path folder) throws IOException {
        if (Files.isDirectory(folder)) {
            return;
        }
        Path parent = folder.toAbsolutePath().getParent();
        if (parent != null) {
            Files.createDirectories(parent);
        }
        Files.createDirectory(folder);
        allow(folder, "rwx------");
    }

    /** Writes the whole text or nothing. */
    static void write(Path file, String text) throws IOException {
        Path part = file.resolveSibling(file.getFileName() + ".part");
        Files.deleteIfExists(part);
        Files.createFile(part);
        allow(part, "rw-------");
        Files.writeString(part, text);
        Files.move(part, file, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
    }

    static void allow(Path path, String rights) throws IOException {
        if (POSIX) {
            Files.setPosixFilePermissions(path, PosixFilePermissions.fromString(rights));
        }
    }

    /** Deletes a folder with all that is in it; links are deleted, not followed. */
    static void delete(Path folder) throws IOException {
        if (!Files.isDirectory(folder)) {
            return;
        }
        try (Stream<Path> paths = Files.walk(folder)) {
            for (Path path : paths.sorted((a, b) -> b.compareTo(a)).toList()) {
                Files.delete(path);
            }
        }
    }
}
