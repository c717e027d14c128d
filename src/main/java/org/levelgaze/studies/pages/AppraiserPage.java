package org.levelgaze.studies.pages;

import java.util.List;
import org.levelgaze.plot.Picture;
import org.levelgaze.register.Appraiser;
import org.levelgaze.register.AppraiserKind;
import org.levelgaze.register.Task;

/**
 * One appraiser over time.
 *
 * @param appraiser who
 * @param trends one for each task with a concluded study
 * @param rungs a camera's configurations, the newest first; none for a person
 */
record AppraiserPage(Appraiser appraiser, List<TaskTrend> trends, List<Rung> rungs) {

    /**
     * An appraiser's studies of one task.
     *
     * @param task what was judged
     * @param newest how the newest study stands, in one sentence
     * @param plane the mistake plane with its trail
     * @param pictures effectiveness, false accept, false reject and c over time
     * @param ratios the bias ratios over time
     */
    record TaskTrend(Task task, String newest, Picture plane, List<Picture> pictures, Table ratios) {}

    /**
     * What a camera judged with, and the studies made with it.
     *
     * @param label of the configuration; empty: before the first one was entered
     * @param since the instant it took effect, written; empty: from the start
     * @param note what changed
     * @param studies made with it
     */
    record Rung(String label, String since, String note, List<Made> studies) {}

    /** A study and its day, written. */
    record Made(long id, String day) {}

    /** Whether it is a camera; called by the template. */
    public boolean isCamera() {
        return appraiser.kind() == AppraiserKind.CAMERA;
    }
}
