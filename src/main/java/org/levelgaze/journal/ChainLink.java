package org.levelgaze.journal;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.HexFormat;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.stream.Collectors;
import org.levelgaze.shared.SiteId;

/** A stored entry, and the hash that it ought to have: the same rule as the database's, written a second time. */
record ChainLink(JournalEntry entry) {

    private static final HexFormat HEX = HexFormat.of();
    private static final DateTimeFormatter MICROSECONDS =
            DateTimeFormatter.ofPattern("uuuu-MM-dd'T'HH:mm:ss.SSSSSS'Z'", Locale.ROOT);

    static ChainLink read(ResultSet row) throws SQLException {
        return new ChainLink(new JournalEntry(
                row.getLong("seq"),
                Objects.requireNonNull(row.getObject("at", OffsetDateTime.class))
                        .toInstant(),
                row.getString("actor"),
                row.getString("act"),
                row.getString("subject"),
                HEX.formatHex(row.getBytes("payload_digest")),
                HEX.formatHex(row.getBytes("previous_hash")),
                HEX.formatHex(row.getBytes("hash"))));
    }

    /** The hash that this entry has if nothing in it was changed. */
    String expectedHash(SiteId site) {
        String text = List.of(
                        Integer.toString(site.value()),
                        Long.toString(entry.seq()),
                        MICROSECONDS.format(entry.at().atOffset(ZoneOffset.UTC)),
                        entry.actor(),
                        entry.act(),
                        entry.subject(),
                        entry.payloadDigest())
                .stream()
                .map(part -> part.getBytes(StandardCharsets.UTF_8).length + ":" + part + ",")
                .collect(Collectors.joining());
        MessageDigest digest = newSha256();
        digest.update(HEX.parseHex(entry.previousHash()));
        return HEX.formatHex(digest.digest(text.getBytes(StandardCharsets.UTF_8)));
    }

    static byte[] sha256(byte[] bytes) {
        return newSha256().digest(bytes);
    }

    private static MessageDigest newSha256() {
        try {
            return MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("Every Java platform has SHA-256", e);
        }
    }
}
