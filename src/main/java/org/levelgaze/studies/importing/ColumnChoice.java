package org.levelgaze.studies.importing;

import org.jspecify.annotations.Nullable;

/**
 * What somebody said about one column, as typed.
 *
 * @param role the word of a {@link ColumnRole}; empty: the column is left out
 * @param appraiser whose calls it holds, where no column says so
 * @param trial in which trial they were made, where no column says so
 */
record ColumnChoice(String role, String appraiser, String trial) {

    static final ColumnChoice LEFT_OUT = new ColumnChoice("", "", "");

    /** Takes what a form leaves out as nothing said. */
    ColumnChoice(@Nullable String role, @Nullable String appraiser, @Nullable String trial) {
        this.role = Typed.text(role);
        this.appraiser = Typed.text(appraiser);
        this.trial = Typed.text(trial);
    }

    static ColumnChoice of(ColumnRole role) {
        return new ColumnChoice(role.word(), "", "");
    }

    boolean is(ColumnRole wanted) {
        return role.equals(wanted.word());
    }
}
