package org.levelgaze.journal;

import org.jspecify.annotations.Nullable;

/**
 * What walking a site's whole chain showed.
 *
 * @param intact whether every entry is there and as it was written
 * @param entries how many entries are stored
 * @param firstBroken the number of the first entry that is changed or missing, null when the chain is intact
 * @param headHash the hash of the last stored entry, 64 hexadecimal digits, zeros when there is none. Kept elsewhere, it
 *     shows later whether entries were cut off the end, which the chain alone cannot tell
 */
public record JournalVerification(
        boolean intact, long entries, @Nullable Long firstBroken, String headHash) {}
