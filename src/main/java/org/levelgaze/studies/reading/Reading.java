package org.levelgaze.studies.reading;

import java.util.List;
import org.levelgaze.shared.RowError;

/** What came of reading a file: all of its calls, or the rows that stand in the way. */
public sealed interface Reading {

    /**
     * Every row could be taken.
     *
     * @param calls the calls
     */
    record Read(RecordedCalls calls) implements Reading {}

    /**
     * Some rows could not be taken; nothing is kept.
     *
     * @param first the first of them, by row
     * @param inAll how many there are in all
     */
    record Refused(List<RowError> first, long inAll) implements Reading {

        /** Keeps its own copy of the list. */
        public Refused {
            first = List.copyOf(first);
        }
    }
}
