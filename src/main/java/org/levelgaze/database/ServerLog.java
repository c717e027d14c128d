package org.levelgaze.database;

import java.io.IOException;
import java.io.RandomAccessFile;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/**
 * What PostgreSQL writes into its log folder, from a moment on: a file per weekday goes on from the week before.
 *
 * @param lengths of the files at that moment
 * @param folder the log folder
 */
record ServerLog(Path folder, Map<Path, Long> lengths) {

    /** From now on. */
    static ServerLog from(Path folder) {
        Map<Path, Long> lengths = new HashMap<>();
        files(folder).forEach(file -> lengths.put(file, file.toFile().length()));
        return new ServerLog(folder, Map.copyOf(lengths));
    }

    /** What was written since. */
    String said() {
        return files(folder).stream()
                .map(this::said)
                .collect(Collectors.joining())
                .strip();
    }

    private String said(Path file) {
        long before = lengths.getOrDefault(file, 0L);
        try (RandomAccessFile log = new RandomAccessFile(file.toFile(), "r")) {
            byte[] text = new byte[(int) Math.max(0, log.length() - before)];
            log.seek(before);
            log.readFully(text);
            return new String(text, StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static List<Path> files(Path folder) {
        try (Stream<Path> files = Files.list(folder)) {
            return files.filter(file -> file.toString().endsWith(".log"))
                    .sorted()
                    .toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
