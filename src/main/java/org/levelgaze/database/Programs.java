package org.levelgaze.database;

import java.io.BufferedInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.security.DigestInputStream;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.Locale;
import org.apache.commons.compress.archivers.tar.TarArchiveEntry;
import org.apache.commons.compress.archivers.tar.TarArchiveInputStream;
import org.jspecify.annotations.Nullable;
import org.tukaani.xz.XZInputStream;

/** PostgreSQL's programs as they come in the jar, unpacked once per version below the home folder. */
final class Programs {

    /** The major version in the jar: the one whose data folders its programs can read. */
    static final String MAJOR = "17";

    private Programs() {}

    /** The folder that holds {@code bin}, {@code lib} and {@code share}; unpacked when it is not there yet. */
    static Path unpack(Home home, String archive) {
        try {
            Path folder = home.programs().resolve(digest(archive));
            if (!Files.isDirectory(folder)) {
                Path unfinished = home.programs().resolve("unfinished");
                OwnerOnly.delete(unfinished);
                OwnerOnly.createFolder(home.make(home.programs()).resolve("unfinished"));
                try (InputStream packed = open(archive)) {
                    unpack(packed, unfinished);
                }
                Files.move(unfinished, folder, StandardCopyOption.ATOMIC_MOVE);
            }
            return folder;
        } catch (IOException e) {
            throw new DatabaseRefusal(
                    "PostgreSQL cannot be unpacked into " + home.programs() + ": " + e + ".",
                    "Make room (about 80 MB) and see that this user can write there, or name another LEVELGAZE_HOME.");
        }
    }

    /** The archive's name for this machine. */
    static String archive() {
        return archive(System.getProperty("os.name"), System.getProperty("os.arch"));
    }

    static String archive(String system, String processor) {
        String name = system.toLowerCase(Locale.ROOT);
        String family = name.startsWith("windows") ? "windows" : name.startsWith("mac") ? "darwin" : "linux";
        String kind = processor.equals("aarch64") ? "arm_64" : "x86_64";
        return "postgres-" + family + "-" + kind + ".txz";
    }

    private static InputStream open(String archive) {
        @Nullable InputStream stream = Programs.class.getResourceAsStream("/" + archive);
        if (stream == null) {
            throw new DatabaseRefusal(
                    "This jar was built for another kind of machine: it does not bring " + archive + ".",
                    "Build it on this kind of machine, or name a PostgreSQL server in SPRING_DATASOURCE_URL.");
        }
        return new BufferedInputStream(stream, 1 << 16);
    }

    private static String digest(String archive) throws IOException {
        try (DigestInputStream stream = new DigestInputStream(open(archive), MessageDigest.getInstance("SHA-256"))) {
            stream.transferTo(OutputStream.nullOutputStream());
            return HexFormat.of().formatHex(stream.getMessageDigest().digest(), 0, 8);
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException(e);
        }
    }

    private static void unpack(InputStream packed, Path folder) throws IOException {
        TarArchiveInputStream tar = new TarArchiveInputStream(new XZInputStream(packed));
        for (TarArchiveEntry entry = tar.getNextEntry(); entry != null; entry = tar.getNextEntry()) {
            Path target = folder.resolve(entry.getName()).normalize();
            if (!target.startsWith(folder)) {
                throw new IOException("The archive names a place outside: " + entry.getName());
            }
            write(tar, entry, target);
        }
    }

    private static void write(TarArchiveInputStream tar, TarArchiveEntry entry, Path target) throws IOException {
        if (entry.isDirectory()) {
            Files.createDirectories(target);
        } else if (!onlyForDevelopers(entry.getName())) {
            Files.createDirectories(parent(target));
            if (entry.isSymbolicLink()) {
                Files.createSymbolicLink(target, Path.of(entry.getLinkName()));
            } else {
                Files.copy(tar, target);
                OwnerOnly.allow(target, (entry.getMode() & 0100) == 0 ? "rw-r--r--" : "rwxr-xr-x");
            }
        }
    }

    private static boolean onlyForDevelopers(String name) {
        return name.endsWith(".a") || name.contains("include/") || name.contains("pkgconfig/");
    }

    private static Path parent(Path path) {
        Path parent = path.getParent();
        if (parent == null) {
            throw new UncheckedIOException(new IOException("No folder above " + path));
        }
        return parent;
    }
}
