package org.levelgaze.journal;

import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Propagation;
import org.springframework.transaction.annotation.Transactional;

/** Records acts in the transaction that performs them. */
@Service
public class Journal {

    /**
     * Writes an entry with the transaction under way; it is written just before the commit, since the chain lets one
     * writer pass at a time.
     */
    @Transactional(propagation = Propagation.MANDATORY)
    public void record(Actor actor, Act act) {
        throw new UnsupportedOperationException(actor + " " + act);
    }
}
