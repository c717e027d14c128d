package org.levelgaze.studies.reading;

import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;

/**
 * Which column of a file is what. Columns are known by their name in the header, without regard to case and to blanks
 * around it. Long files have one call in a row, wide files several: one call column for each appraiser, each trial, or both.
 *
 * <p>Columns for the reference, the defect and the kind seen may be absent from the file; all others must be there.
 *
 * @param piece column of the piece's label
 * @param reference column of the true state; {@code null} when there is none
 * @param defect column of the true defect kind; {@code null} when there is none
 * @param appraiser column of the appraiser; {@code null} when every call column names its own
 * @param trial column of the trial number; {@code null} when every call column names its own
 * @param calls the call columns, one or more
 */
public record Layout(
        String piece,
        @Nullable String reference,
        @Nullable String defect,
        @Nullable String appraiser,
        @Nullable String trial,
        List<CallColumn> calls) {

    /**
     * A column of calls.
     *
     * @param column its name
     * @param appraiser whose calls they are; {@code null} when a column says so
     * @param trial in which trial they were made, from 1; {@code null} when a column says so
     * @param seen column of the defect kind named with the call; {@code null} when there is none
     */
    public record CallColumn(
            String column,
            @Nullable String appraiser,
            @Nullable Integer trial,
            @Nullable String seen) {

        /** Refuses a trial below 1 and an appraiser without a name. */
        public CallColumn {
            if (trial != null && (trial < 1 || trial > Limits.TRIAL)) {
                throw new IllegalArgumentException("Trials are numbered from 1 to " + Limits.TRIAL + ", not " + trial);
            }
            if (appraiser != null && appraiser.isBlank()) {
                throw new IllegalArgumentException("The appraiser of column '" + column + "' has no name");
            }
        }
    }

    private static final Layout STANDARD = new Layout(
            "piece", "reference", "defect", "appraiser", "trial", List.of(new CallColumn("call", null, null, "seen")));

    /** Refuses a layout in which an appraiser or a trial is said twice or not at all, or two columns hold the same calls. */
    public Layout {
        calls = List.copyOf(calls);
        if (calls.isEmpty()) {
            throw new IllegalArgumentException("A layout needs a column of calls");
        }
        Set<List<Object>> sources = new HashSet<>();
        for (CallColumn call : calls) {
            if ((appraiser == null) == (call.appraiser() == null)) {
                throw new IllegalArgumentException("Column '" + call.column() + "' needs one source of its appraiser");
            }
            if ((trial == null) == (call.trial() == null)) {
                throw new IllegalArgumentException("Column '" + call.column() + "' needs one source of its trial");
            }
            Object who = call.appraiser() == null ? "" : call.appraiser();
            Object when = call.trial() == null ? "" : call.trial();
            if (!sources.add(List.of(who, when))) {
                throw new IllegalArgumentException(
                        "Column '" + call.column() + "' holds the same appraiser and trial as another");
            }
        }
    }

    /** {@code piece,reference,appraiser,trial,call}, and {@code defect,seen} where they are there. */
    public static Layout standard() {
        return STANDARD;
    }
}
