package org.levelgaze.studies.pages;

import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import org.levelgaze.plot.Picture;

/**
 * A page of the list of studies.
 *
 * @param lines one for each study
 * @param count how many studies the filter lets through
 * @param page number of this page, from 0
 * @param more whether a further page exists
 * @param tasks the tasks to choose from, code and name
 * @param sets the codes of the sets to choose from
 * @param appraisers the appraisers to choose from, code and name
 */
record StudyList(
        List<Line> lines,
        int count,
        int page,
        boolean more,
        Map<String, String> tasks,
        Map<String, String> sets,
        Map<String, String> appraisers) {

    /** One study and what it showed of each appraiser. */
    record Line(StudyHeading heading, List<Lean> leans, int further) {}

    /**
     * One appraiser's lean, small.
     *
     * @param name who
     * @param picture null where no mistake was made
     */
    record Lean(String name, @Nullable Picture picture) {}
}
