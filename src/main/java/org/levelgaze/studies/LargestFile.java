package org.levelgaze.studies;

import java.io.FilterInputStream;
import java.io.IOException;
import java.io.InputStream;
import org.levelgaze.shared.Refusal;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.stereotype.Component;
import org.springframework.util.unit.DataSize;

/** How large a file may be, over the API and on a page alike. */
@Component
public class LargestFile {

    private final DataSize size;

    LargestFile(@Value("${levelgaze.import.largest-file}") DataSize size) {
        this.size = size;
    }

    /** The most bytes of a file. */
    public long bytes() {
        return size.toBytes();
    }

    /**
     * Lets no more bytes through than a file may have.
     *
     * @param content the bytes of a file
     * @param announced how many there are said to be; negative: not said
     * @return the same bytes; reading beyond the limit throws the refusal
     * @throws Refusal when more are announced; nothing is read then
     */
    public InputStream within(InputStream content, long announced) {
        if (announced > bytes()) {
            throw refusal();
        }
        return new Counted(content);
    }

    private Refusal refusal() {
        return new Refusal(Refusal.Kind.TOO_LARGE, "upload-too-large", size.toMegabytes());
    }

    private final class Counted extends FilterInputStream {

        private long left = bytes();

        Counted(InputStream content) {
            super(content);
        }

        @Override
        public int read() throws IOException {
            int one = super.read();
            count(one < 0 ? 0 : 1);
            return one;
        }

        @Override
        public int read(byte[] target, int offset, int length) throws IOException {
            int got = super.read(target, offset, length);
            count(Math.max(got, 0));
            return got;
        }

        private void count(int got) {
            left -= got;
            if (left < 0) {
                throw refusal();
            }
        }
    }
}
