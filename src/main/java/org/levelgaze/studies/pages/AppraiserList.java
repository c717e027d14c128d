package org.levelgaze.studies.pages;

import java.util.List;
import org.jspecify.annotations.Nullable;
import org.levelgaze.plot.Picture;
import org.levelgaze.register.Appraiser;
import org.levelgaze.studies.Figure;

/**
 * Everybody who judges at a site.
 *
 * @param lines one for each appraiser
 */
record AppraiserList(List<Line> lines) {

    /**
     * One appraiser.
     *
     * @param appraiser who
     * @param newest the figure of the newest study; null: none yet
     * @param right how often right in it, in words; empty without a study
     * @param lean the lean in it; null without a study or without a mistake
     */
    record Line(
            Appraiser appraiser,
            @Nullable Figure newest,
            String right,
            @Nullable Picture lean) {}
}
