package org.levelgaze.studies.pages;

import java.util.List;

/**
 * Figures as a table, already written in the reader's language; the first cell of a row is its head. Public methods are
 * called by templates.
 *
 * @param caption what it shows; empty when the section says so
 * @param head the heads of the columns
 * @param rows each as long as the head
 */
record Table(String caption, List<String> head, List<List<String>> rows) {

    /** Refuses rows that are not as long as the head. */
    public Table {
        head = List.copyOf(head);
        rows = rows.stream().map(List::copyOf).toList();
        for (List<String> row : rows) {
            if (row.size() != head.size()) {
                throw new IllegalArgumentException("A row of " + row.size() + " under " + head.size() + " heads");
            }
        }
    }
}
