package org.levelgaze.studies.pages;

import java.util.List;
import org.levelgaze.plot.Picture;

/**
 * One question of a study and its answer in numbers.
 *
 * @param title the question
 * @param notes what must stand beside the numbers
 * @param tables the numbers
 * @param pictures the numbers drawn
 * @param terms what each figure means, one click away
 */
record Section(String title, List<String> notes, List<Table> tables, List<Drawn> pictures, List<Term> terms) {

    /**
     * A figure and what it means.
     *
     * @param name its name
     * @param meaning in words
     */
    public record Term(String name, String meaning) {}

    /**
     * A picture and whom it shows.
     *
     * @param name the appraiser's name
     * @param picture his figures
     */
    public record Drawn(String name, Picture picture) {}

    /** Keeps its own copies. */
    public Section {
        notes = List.copyOf(notes);
        tables = List.copyOf(tables);
        pictures = List.copyOf(pictures);
        terms = List.copyOf(terms);
    }
}
