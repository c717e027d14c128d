package org.levelgaze.studies.reading;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.SequenceInputStream;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import org.jspecify.annotations.Nullable;

/** The first bytes of a file: what kind of file it is, whether it has a byte-order mark, and what its delimiter is. */
final class FileHead {

    private static final int LENGTH = 1 << 16;
    private static final int BOM_LENGTH = 3;

    private final byte[] head;
    private final int start;

    private FileHead(byte[] head, int start) {
        this.head = head;
        this.start = start;
    }

    /** Reads the first bytes and refuses what is no text in UTF-8. */
    static FileHead of(InputStream file) throws IOException {
        byte[] head = file.readNBytes(LENGTH);
        if (head.length == 0) {
            throw CallFile.refusal("file-empty");
        }
        String packed = packed(head);
        if (packed != null) {
            throw CallFile.refusal("file-packed", packed);
        }
        String wide = wideEncoding(head);
        if (wide != null) {
            throw CallFile.refusal("file-encoding", wide, "1");
        }
        return new FileHead(head, startsWith(head, 0xEF, 0xBB, 0xBF) ? BOM_LENGTH : 0);
    }

    /** All bytes after the byte-order mark. */
    InputStream rest(InputStream file) {
        return new SequenceInputStream(new ByteArrayInputStream(head, start, head.length - start), file);
    }

    /** The one of comma, semicolon and tab that parts the header into most columns. */
    char delimiter() {
        String text = new String(head, start, head.length - start, StandardCharsets.UTF_8);
        int[] found = new int[3];
        boolean quoted = false;
        for (int at = 0; at < text.length() && (quoted || !isLineEnd(text.charAt(at))); at++) {
            quoted ^= text.charAt(at) == '"';
            int which = quoted ? -1 : ",;\t".indexOf(text.charAt(at));
            if (which >= 0) {
                found[which]++;
            }
        }
        int most = 0;
        for (int which = 1; which < found.length; which++) {
            most = found[which] > found[most] ? which : most;
        }
        return ",;\t".charAt(most);
    }

    private static boolean isLineEnd(char c) {
        return c == '\n' || c == '\r';
    }

    /** What a packed file or a spreadsheet file is called, by the bytes it begins with. */
    private static @Nullable String packed(byte[] head) {
        if (startsWith(head, 0x1F, 0x8B)) {
            return "gzip";
        }
        if (startsWith(head, 'P', 'K', 3, 4) || startsWith(head, 'P', 'K', 5, 6)) {
            return "zip, xlsx";
        }
        if (startsWith(head, 0xD0, 0xCF, 0x11, 0xE0)) {
            return "xls";
        }
        if (startsWith(head, '%', 'P', 'D', 'F')) {
            return "PDF";
        }
        if (startsWith(head, 'B', 'Z', 'h')
                || startsWith(head, 0xFD, '7', 'z')
                || startsWith(head, 0x28, 0xB5, 0x2F, 0xFD)) {
            return "bzip2, xz, zstd";
        }
        return null;
    }

    /** UTF-16 and UTF-32, by their byte-order mark or by every other byte of the first few being 0. */
    private static @Nullable String wideEncoding(byte[] head) {
        if (startsWith(head, 0xFF, 0xFE, 0, 0) || startsWith(head, 0, 0, 0xFE, 0xFF)) {
            return "UTF-32";
        }
        if (startsWith(head, 0xFF, 0xFE) || startsWith(head, 0xFE, 0xFF)) {
            return "UTF-16";
        }
        byte[] first = Arrays.copyOf(head, 4);
        boolean everySecond = first[1] == 0 && first[3] == 0 && first[0] != 0 && first[2] != 0;
        boolean everyFirst = first[0] == 0 && first[2] == 0 && first[1] != 0 && first[3] != 0;
        return head.length >= first.length && (everySecond || everyFirst) ? "UTF-16" : null;
    }

    private static boolean startsWith(byte[] head, int... bytes) {
        if (head.length < bytes.length) {
            return false;
        }
        for (int at = 0; at < bytes.length; at++) {
            if ((head[at] & 0xFF) != bytes[at]) {
                return false;
            }
        }
        return true;
    }
}
