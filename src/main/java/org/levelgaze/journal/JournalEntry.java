package org.levelgaze.journal;

import java.time.Instant;

/**
 * One entry of a site's journal, as it is stored.
 *
 * @param seq its place in the site's chain, from 1 without gaps
 * @param at when it was written, by the database's clock, in microseconds
 * @param actor who acted: {@code account:7}, {@code token:3} or {@code system}
 * @param act what was done, as {@code thing.verb}
 * @param subject on what, as {@code thing:id}
 * @param payloadDigest SHA-256 of what the act was about, 64 hexadecimal digits
 * @param previousHash the hash of the entry before, 64 hexadecimal digits; zeros for the first
 * @param hash the entry's own hash, 64 hexadecimal digits
 */
public record JournalEntry(
        long seq,
        Instant at,
        String actor,
        String act,
        String subject,
        String payloadDigest,
        String previousHash,
        String hash) {}
