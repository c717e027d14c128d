package org.levelgaze.database;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.channels.OverlappingFileLockException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;

/** Keeps a second program out of the same folder. The operating system frees it when the program dies, however it dies. */
final class HomeLock implements AutoCloseable {

    /** Far behind the text, so that the text can be read while the lock is held, on Windows too. */
    private static final long LOCKED_BYTE = 1L << 40;

    private final FileChannel channel;

    private HomeLock(FileChannel channel) {
        this.channel = channel;
    }

    static HomeLock take(Home home) {
        try {
            FileChannel channel = FileChannel.open(home.lock(), StandardOpenOption.CREATE, StandardOpenOption.WRITE);
            if (!locked(channel)) {
                channel.close();
                throw new DatabaseRefusal(
                        "The folder " + home.folder() + " is in use by another Levelgaze" + holder(home.lock()) + ".",
                        "Stop that one first, or give this one a folder of its own in LEVELGAZE_HOME.");
            }
            channel.truncate(0);
            long process = ProcessHandle.current().pid();
            channel.write(ByteBuffer.wrap(Long.toString(process).getBytes(StandardCharsets.UTF_8)), 0);
            return new HomeLock(channel);
        } catch (IOException e) {
            throw new DatabaseRefusal(
                    "The file " + home.lock() + " cannot be locked: " + e + ".",
                    "Put LEVELGAZE_HOME on a file system that knows file locks and that this user can write to.");
        }
    }

    /** Whether no other program has the folder now. */
    static boolean isFree(Home home) {
        try (FileChannel channel = FileChannel.open(home.lock(), StandardOpenOption.CREATE, StandardOpenOption.WRITE)) {
            return locked(channel);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static boolean locked(FileChannel channel) throws IOException {
        try {
            return channel.tryLock(LOCKED_BYTE, 1, false) != null;
        } catch (OverlappingFileLockException e) {
            return false;
        }
    }

    private static String holder(Path lock) {
        try {
            return " (process " + Files.readString(lock) + ")";
        } catch (IOException e) {
            return "";
        }
    }

    @Override
    public void close() {
        try {
            channel.close();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
