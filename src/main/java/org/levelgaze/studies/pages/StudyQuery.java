package org.levelgaze.studies.pages;

import java.time.LocalDate;
import org.jspecify.annotations.Nullable;
import org.springframework.format.annotation.DateTimeFormat;

/**
 * What the list of studies is asked for; empty: any.
 *
 * @param task a task's code
 * @param set a set's code
 * @param appraiser an appraiser's code
 * @param from performed on this day or later
 * @param to performed on this day or earlier
 * @param page number of the page, from 0
 */
record StudyQuery(
        @Nullable String task,
        @Nullable String set,
        @Nullable String appraiser,

        @DateTimeFormat(iso = DateTimeFormat.ISO.DATE) @Nullable
        LocalDate from,

        @DateTimeFormat(iso = DateTimeFormat.ISO.DATE) @Nullable
        LocalDate to,

        @Nullable Integer page) {

    int pageNumber() {
        return page == null ? 0 : Math.max(0, page);
    }

    /** Whether anything is filtered; called by the template. */
    public boolean narrows() {
        return given(task) || given(set) || given(appraiser) || from != null || to != null;
    }

    static boolean given(@Nullable String word) {
        return word != null && !word.isEmpty();
    }
}
