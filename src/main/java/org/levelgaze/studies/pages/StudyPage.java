package org.levelgaze.studies.pages;

import java.util.List;
import org.jspecify.annotations.Nullable;
import org.levelgaze.plot.Picture;
import org.levelgaze.studies.sentences.InWords;

/**
 * A study as its pages show it.
 *
 * @param heading what it was
 * @param warnings what a reader must know first
 * @param appraisers each by himself; none before the conclusion
 * @param sections the numbers, question by question; none before the conclusion
 */
record StudyPage(StudyHeading heading, List<String> warnings, List<Appraised> appraisers, List<Section> sections) {

    /** How many appraisers are drawn; all of them stand in the tables. */
    static final int MOST_DRAWN = 12;

    /**
     * One appraiser of the study.
     *
     * @param name as it stands on screen
     * @param code for the link to the appraiser's page
     * @param words what the study says of him
     * @param lean the lean scale; null without a mistake, or with too many appraisers to draw
     */
    public record Appraised(
            String name,
            String code,
            InWords words,
            @Nullable Picture lean) {}

    /** Keeps its own copies. */
    public StudyPage {
        warnings = List.copyOf(warnings);
        appraisers = List.copyOf(appraisers);
        sections = List.copyOf(sections);
    }

    /** How many appraisers are drawn at most. */
    public int drawn() {
        return MOST_DRAWN;
    }

    /** Whether some appraisers are not drawn. */
    public boolean notAllDrawn() {
        return appraisers.size() > MOST_DRAWN;
    }

    /** Whether every appraiser held the usual limits. */
    public boolean allHeld() {
        return appraisers.stream().allMatch(one -> one.words().isHeld());
    }
}
