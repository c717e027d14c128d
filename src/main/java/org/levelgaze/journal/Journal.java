package org.levelgaze.journal;

import java.util.List;
import java.util.Optional;
import javax.sql.DataSource;
import org.levelgaze.shared.SiteId;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.jdbc.core.RowCallbackHandler;
import org.springframework.jdbc.core.RowMapper;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Propagation;
import org.springframework.transaction.annotation.Transactional;
import org.springframework.transaction.support.TransactionSynchronizationManager;

/** Records acts in the transaction that performs them, and shows and verifies what was recorded. */
@Service
public class Journal {

    private static final String SELECT =
            "select seq, at, actor, act, subject, payload_digest, previous_hash, hash from journal_entry where site_id = ? ";
    private static final RowMapper<JournalEntry> ENTRIES =
            (row, number) -> ChainLink.read(row).entry();

    private final JdbcTemplate jdbc;
    private final JdbcTemplate streaming;

    Journal(JdbcTemplate jdbc, DataSource database) {
        this.jdbc = jdbc;
        this.streaming = new JdbcTemplate(database);
        this.streaming.setFetchSize(1_000);
    }

    /**
     * Writes an entry with the transaction under way. It is stored just before the commit, since the chain lets one writer
     * of a site pass at a time; a rollback leaves nothing of it.
     *
     * @throws org.springframework.transaction.IllegalTransactionStateException outside a transaction
     */
    @Transactional(propagation = Propagation.MANDATORY)
    public void record(Actor actor, Act act) {
        pending().add(actor, act);
    }

    /**
     * Entries in the order in which they were written.
     *
     * @param after the number of the entry before the first one wanted, 0 for the start
     * @param limit how many at most
     */
    @Transactional(readOnly = true)
    public List<JournalEntry> after(SiteId site, long after, int limit) {
        return jdbc.query(SELECT + "and seq > ? order by seq limit ?", ENTRIES, site.value(), after, limit);
    }

    /**
     * Entries with the newest first.
     *
     * @param before the number of the entry after the first one wanted; {@link Long#MAX_VALUE} for the newest
     * @param limit how many at most
     */
    @Transactional(readOnly = true)
    public List<JournalEntry> before(SiteId site, long before, int limit) {
        return jdbc.query(SELECT + "and seq < ? order by seq desc limit ?", ENTRIES, site.value(), before, limit);
    }

    /** Walks the site's whole chain, computes every hash anew, and names the first entry that is changed or missing. */
    @Transactional(readOnly = true)
    public JournalVerification verify(SiteId site) {
        ChainWalk walk = new ChainWalk(site);
        RowCallbackHandler eachEntry = row -> walk.next(ChainLink.read(row));
        streaming.query(SELECT + "order by seq", eachEntry, site.value());
        return walk.result();
    }

    /** The entries that wait for the commit of this transaction; a transaction within another has its own. */
    private PendingEntries pending() {
        Optional<PendingEntries> present = TransactionSynchronizationManager.getSynchronizations().stream()
                .filter(PendingEntries.class::isInstance)
                .map(PendingEntries.class::cast)
                .findFirst();
        return present.orElseGet(() -> {
            PendingEntries entries = new PendingEntries(jdbc);
            TransactionSynchronizationManager.registerSynchronization(entries);
            return entries;
        });
    }
}
