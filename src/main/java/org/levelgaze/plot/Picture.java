package org.levelgaze.plot;

import java.util.List;

/**
 * A picture and its twin as a table.
 *
 * @param svg one {@code svg} element, every text in it escaped: may be written into a page as it is
 * @param caption how to read it, plain text
 * @param tableHead the heads of the table's columns, plain text
 * @param tableRows the rows of the table, each as long as the head, plain text
 */
public record Picture(String svg, String caption, List<String> tableHead, List<List<String>> tableRows) {

    /** Refuses rows that are not as long as the head. */
    public Picture {
        tableHead = List.copyOf(tableHead);
        tableRows = tableRows.stream().map(List::copyOf).toList();
        for (List<String> row : tableRows) {
            if (row.size() != tableHead.size()) {
                throw new IllegalArgumentException("A row of " + row.size() + " under " + tableHead.size() + " heads");
            }
        }
    }
}
