package org.levelgaze.studies.pages;

import java.util.List;

/**
 * One question of a study and its answer in numbers.
 *
 * @param title the question
 * @param notes what must stand beside the numbers
 * @param tables the numbers
 * @param terms what each figure means, one click away
 */
record Section(String title, List<String> notes, List<Table> tables, List<Term> terms) {

    /**
     * A figure and what it means.
     *
     * @param name its name
     * @param meaning in words
     */
    public record Term(String name, String meaning) {}

    /** Keeps its own copies. */
    public Section {
        notes = List.copyOf(notes);
        tables = List.copyOf(tables);
        terms = List.copyOf(terms);
    }
}
