package org.levelgaze.journal;

import org.jspecify.annotations.Nullable;
import org.levelgaze.shared.SiteId;

/** One walk along a chain, entry by entry from the first. */
final class ChainWalk {

    private final SiteId site;
    private long entries;
    private String head = "0".repeat(64);
    private @Nullable Long firstBroken;

    ChainWalk(SiteId site) {
        this.site = site;
    }

    void next(ChainLink link) {
        entries++;
        if (firstBroken == null) {
            check(link, entries);
        }
        head = link.entry().hash();
    }

    /** A gap names the entry that is missing, anything else the entry that does not fit. */
    private void check(ChainLink link, long expected) {
        JournalEntry entry = link.entry();
        if (entry.seq() != expected
                || !entry.previousHash().equals(head)
                || !entry.hash().equals(link.expectedHash(site))) {
            firstBroken = expected;
        }
    }

    JournalVerification result() {
        return new JournalVerification(firstBroken == null, entries, firstBroken, head);
    }
}
