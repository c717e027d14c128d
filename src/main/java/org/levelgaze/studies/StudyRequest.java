package org.levelgaze.studies;

import java.time.LocalDate;
import org.jspecify.annotations.Nullable;

/**
 * What a file of calls is said to be.
 *
 * @param task the task's code
 * @param set the reference set's code
 * @param performedOn the day at the site
 * @param configuration the label of the camera configuration it was made with; null: the one in force
 * @param conclude whether its findings are to stand at once
 * @param fileName what the file is called; empty when it has no name
 * @param consent what new things may be entered on the way
 */
public record StudyRequest(
        String task,
        String set,
        LocalDate performedOn,
        @Nullable String configuration,
        boolean conclude,
        String fileName,
        Consent consent) {}
