package org.levelgaze.database;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/**
 * What a PostgreSQL wrote into {@code postmaster.pid} of its data folder.
 *
 * @param pid its process
 * @param data the data folder it serves
 */
record PidFile(long pid, Path data) {

    /** What is known about the process that a pid file names. */
    enum Holder {
        /** It has ended; PostgreSQL itself starts over such a file. */
        GONE,
        /** It is a PostgreSQL that serves the folder. */
        OURS,
        /** It lives and is something else: the number was given to another process since. */
        FOREIGN,
        /** It lives, or is just ending, and cannot be looked at. */
        UNKNOWN
    }

    static Path in(Path data) {
        return data.resolve("postmaster.pid");
    }

    /** The file of this data folder; none when there is no such file or when it is not complete. */
    static Optional<PidFile> read(Path data) {
        try {
            List<String> lines = Files.readAllLines(in(data));
            return lines.size() < 2
                    ? Optional.empty()
                    : Optional.of(new PidFile(Long.parseLong(lines.get(0).strip()), Path.of(lines.get(1))));
        } catch (NoSuchFileException | NumberFormatException e) {
            return Optional.empty();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** Looks at the process, to find out whether it serves this data folder. */
    Holder holder(Path folder) {
        Optional<ProcessHandle> living = ProcessHandle.of(pid).filter(ProcessHandle::isAlive);
        if (living.isEmpty()) {
            return Holder.GONE;
        }
        ProcessHandle.Info info = living.get().info();
        if (info.command().isEmpty()) {
            return Holder.UNKNOWN;
        }
        boolean postgres =
                Path.of(info.command().get()).getFileName().toString().startsWith("postgres");
        boolean named = info.arguments()
                .map(arguments -> List.of(arguments).contains(folder.toString()))
                .orElse(true);
        return postgres && named && data.equals(folder) ? Holder.OURS : Holder.FOREIGN;
    }
}
