package org.levelgaze.studies.reading;

import java.io.IOException;
import java.io.InputStream;
import java.io.Reader;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CoderResult;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;

/**
 * The text of a file in UTF-8, strictly: a byte that is none ends it with a refusal that names the line. Rows that never end
 * are stopped, too.
 */
final class Utf8Text extends Reader {

    private final InputStream bytes;
    private final ByteBuffer undecoded = ByteBuffer.allocate(1 << 16).flip();
    private final CharsetDecoder decoder = StandardCharsets.UTF_8
            .newDecoder()
            .onMalformedInput(CodingErrorAction.REPORT)
            .onUnmappableCharacter(CodingErrorAction.REPORT);
    private boolean ended;
    private long line = 1;
    private boolean afterReturn;
    private long charactersOfRow;

    Utf8Text(InputStream bytes) {
        this.bytes = bytes;
    }

    /** Tells that a new row begins. */
    void beginRow() {
        charactersOfRow = 0;
    }

    @Override
    public int read(char[] into, int offset, int length) throws IOException {
        CharBuffer characters = CharBuffer.wrap(into, offset, length).slice();
        while (characters.position() == 0) {
            CoderResult result = decoder.decode(undecoded, characters, ended);
            if (result.isError() && characters.position() == 0) {
                throw CallFile.refusal("file-encoding", "windows-1252", Long.toString(line));
            }
            if (characters.position() == 0 && !fill()) {
                return -1;
            }
        }
        count(into, offset, characters.position());
        return characters.position();
    }

    /** More bytes; false when there are none and none are left to decode. */
    private boolean fill() throws IOException {
        if (ended) {
            return undecoded.hasRemaining();
        }
        undecoded.compact();
        int got = bytes.read(undecoded.array(), undecoded.position(), undecoded.remaining());
        if (got > 0) {
            undecoded.position(undecoded.position() + got);
        }
        undecoded.flip();
        ended = got < 0;
        return true;
    }

    private void count(char[] characters, int offset, int length) {
        for (int at = offset; at < offset + length; at++) {
            char c = characters[at];
            if (c == '\r' || (c == '\n' && !afterReturn)) {
                line++;
            }
            afterReturn = c == '\r';
        }
        charactersOfRow += length;
        if (charactersOfRow > Limits.ROW) {
            throw CallFile.refusal("file-row-too-long", Integer.toString(Limits.ROW), Long.toString(line));
        }
    }

    @Override
    public void close() throws IOException {
        bytes.close();
    }
}
