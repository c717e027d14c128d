package org.levelgaze.studies;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.sql.Connection;
import java.sql.SQLException;
import org.levelgaze.shared.SiteId;
import org.postgresql.PGConnection;
import org.postgresql.copy.CopyIn;

/**
 * Writes the calls of one study through COPY in PostgreSQL's binary form: the fastest way in, with all constraints held.
 *
 * @see <a href="https://www.postgresql.org/docs/17/sql-copy.html">PostgreSQL 17, COPY, binary format</a>
 */
final class CallCopy implements AutoCloseable {

    private static final String COPY =
            "copy study_call (study_id, site_id, appraiser_no, piece_no, trial, kind_no, accepted) from stdin (format binary)";
    private static final byte[] SIGNATURE = {'P', 'G', 'C', 'O', 'P', 'Y', '\n', (byte) 0xff, '\r', '\n', 0};
    private static final int NO_KIND = -1;
    private static final short COLUMNS = 7;
    private static final int NULL_LENGTH = -1;
    private static final int LARGEST_ROW = 64;
    private static final int BUFFER = 1 << 16;

    private final CopyIn copy;
    private final ByteBuffer buffer = ByteBuffer.allocate(BUFFER);
    private final int site;
    private final long study;

    private CallCopy(CopyIn copy, SiteId site, long study) {
        this.copy = copy;
        this.site = site.value();
        this.study = study;
        buffer.put(SIGNATURE).putInt(0).putInt(0);
    }

    static CallCopy start(Connection connection, SiteId site, long study) throws SQLException {
        CopyIn copy = connection.unwrap(PGConnection.class).getCopyAPI().copyIn(COPY);
        return new CallCopy(copy, site, study);
    }

    /**
     * Adds one call.
     *
     * @param kind the number of the kind that was named, or {@value #NO_KIND}
     */
    void add(int appraiser, int piece, int trial, int kind, boolean accepted) {
        if (buffer.remaining() < LARGEST_ROW) {
            send();
        }
        buffer.putShort(COLUMNS);
        buffer.putInt(Long.BYTES).putLong(study);
        buffer.putInt(Integer.BYTES).putInt(site);
        buffer.putInt(Short.BYTES).putShort((short) appraiser);
        buffer.putInt(Integer.BYTES).putInt(piece);
        buffer.putInt(Integer.BYTES).putInt(trial);
        if (kind == NO_KIND) {
            buffer.putInt(NULL_LENGTH);
        } else {
            buffer.putInt(Short.BYTES).putShort((short) kind);
        }
        buffer.putInt(1).put((byte) (accepted ? 1 : 0));
    }

    /** Ends the copy and returns how many rows PostgreSQL took. */
    long finish() {
        if (buffer.remaining() < Short.BYTES) {
            send();
        }
        buffer.putShort((short) -1);
        send();
        try {
            return copy.endCopy();
        } catch (SQLException e) {
            throw new CallsNotStored(e);
        }
    }

    /** Gives the copy up when it was not finished. */
    @Override
    public void close() throws SQLException {
        if (copy.isActive()) {
            copy.cancelCopy();
        }
    }

    private void send() {
        try {
            copy.writeToCopy(buffer.array(), 0, buffer.position());
        } catch (SQLException e) {
            throw new CallsNotStored(e);
        }
        buffer.clear();
    }

    /** The database broke the copy off; the transaction is lost. */
    static final class CallsNotStored extends UncheckedIOException {

        private static final long serialVersionUID = 1L;

        CallsNotStored(SQLException cause) {
            super(new IOException(cause));
        }
    }
}
