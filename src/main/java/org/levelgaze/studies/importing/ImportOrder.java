package org.levelgaze.studies.importing;

import java.time.LocalDate;
import org.jspecify.annotations.Nullable;
import org.levelgaze.studies.Consent;
import org.levelgaze.studies.StudyRequest;

/**
 * What is to be done with a file: a checked form. Kept as JSON with the upload, so that it is found again.
 *
 * @param form the form as it was typed
 * @param task the task's code
 * @param newTaskName the name of the task when it is to be entered; null: it is known
 * @param set the set's code
 * @param performedOn the day
 * @param configuration the label of the camera configuration; null: none named
 * @param mapping what columns and words mean
 * @param consent what may be entered on the way
 */
record ImportOrder(
        ImportForm form,
        String task,
        @Nullable String newTaskName,
        String set,
        LocalDate performedOn,
        @Nullable String configuration,
        Mapping mapping,
        Consent consent) {

    ImportOrder with(Consent answers) {
        return new ImportOrder(form, task, newTaskName, set, performedOn, configuration, mapping, answers);
    }

    StudyRequest request(String fileName) {
        return new StudyRequest(task, set, performedOn, configuration, true, fileName, consent);
    }
}
