package org.levelgaze.access;

import jakarta.servlet.ReadListener;
import jakarta.servlet.ServletInputStream;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletRequestWrapper;
import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.util.Objects;
import org.jspecify.annotations.Nullable;

/** A request whose body is digested while it is read, and kept nowhere: it may be hundreds of megabytes long. */
final class DigestedRequest extends HttpServletRequestWrapper {

    private final MessageDigest digest = Digests.newSha256();
    private @Nullable DigestedBody body;

    DigestedRequest(HttpServletRequest request) {
        super(request);
        String target = request.getMethod() + " " + request.getRequestURI() + "?"
                + Objects.requireNonNullElse(request.getQueryString(), "") + "\n";
        digest.update(target.getBytes(StandardCharsets.UTF_8));
    }

    /** The digest over method, address and body; reads what is left of the body. */
    byte[] digest() throws IOException {
        getInputStream().transferTo(OutputStream.nullOutputStream());
        return digest.digest();
    }

    @Override
    public ServletInputStream getInputStream() throws IOException {
        DigestedBody known = body == null ? new DigestedBody(super.getInputStream(), digest) : body;
        body = known;
        return known;
    }

    @Override
    public BufferedReader getReader() throws IOException {
        String encoding = Objects.requireNonNullElse(getCharacterEncoding(), StandardCharsets.UTF_8.name());
        return new BufferedReader(new InputStreamReader(getInputStream(), encoding));
    }

    private static final class DigestedBody extends ServletInputStream {

        private final ServletInputStream body;
        private final MessageDigest digest;

        DigestedBody(ServletInputStream body, MessageDigest digest) {
            this.body = body;
            this.digest = digest;
        }

        @Override
        public int read() throws IOException {
            int value = body.read();
            if (value >= 0) {
                digest.update((byte) value);
            }
            return value;
        }

        @Override
        public int read(byte[] into, int from, int length) throws IOException {
            int count = body.read(into, from, length);
            if (count > 0) {
                digest.update(into, from, count);
            }
            return count;
        }

        @Override
        public boolean isFinished() {
            return body.isFinished();
        }

        @Override
        public boolean isReady() {
            return body.isReady();
        }

        @Override
        public void setReadListener(ReadListener listener) {
            throw new UnsupportedOperationException("A request with an Idempotency-Key is read in one go");
        }
    }
}
