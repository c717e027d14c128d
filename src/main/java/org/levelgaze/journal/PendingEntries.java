package org.levelgaze.journal;

import java.util.ArrayList;
import java.util.List;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.transaction.support.TransactionSynchronization;

/** The acts of one transaction, which are stored just before it commits. */
final class PendingEntries implements TransactionSynchronization {

    private static final Logger LOG = LoggerFactory.getLogger(PendingEntries.class);
    private static final String INSERT =
            "insert into journal_entry (site_id, actor, act, subject, payload_digest) values (?, ?, ?, ?, ?)";

    private final JdbcTemplate jdbc;
    private final List<Object[]> rows = new ArrayList<>();
    private boolean committing;

    PendingEntries(JdbcTemplate jdbc) {
        this.jdbc = jdbc;
    }

    void add(Actor actor, Act act) {
        rows.add(new Object[] {
            actor.site().value(), actor.who(), act.kind(), act.subject(), ChainLink.sha256(act.payload())
        });
        if (committing) {
            store();
        }
    }

    @Override
    public void beforeCommit(boolean readOnly) {
        committing = true;
        store();
    }

    /** An act first recorded by another step of the commit itself comes too late to be stored; that must not pass in silence. */
    @Override
    public void afterCompletion(int status) {
        if (status == STATUS_COMMITTED && !rows.isEmpty()) {
            LOG.error("{} acts were recorded too late in a commit and are not in the journal", rows.size());
        }
    }

    private void store() {
        jdbc.batchUpdate(INSERT, rows);
        rows.clear();
    }
}
