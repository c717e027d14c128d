package org.levelgaze.studies.sentences;

import java.time.LocalDate;

/**
 * What bears on how far a study can be trusted, beside its figures.
 *
 * @param defective defective pieces that are scored
 * @param good good pieces that are scored
 * @param undecided pieces of the study whose true state is undecided
 * @param trials the most looks that anybody took at a piece
 * @param callsMissing calls that a complete study would hold beside those made
 * @param set the set's code
 * @param truthsFromImport whether nobody has adjudicated the true states
 * @param performedOn the day of the study
 * @param decidedOn the first day on which the set was in date
 * @param validUntil the last day on which it was
 */
public record StudyFacts(
        int defective,
        int good,
        int undecided,
        int trials,
        long callsMissing,
        String set,
        boolean truthsFromImport,
        LocalDate performedOn,
        LocalDate decidedOn,
        LocalDate validUntil) {

    /** All pieces that are scored. */
    public int pieces() {
        return defective + good;
    }

    boolean outOfDate() {
        return performedOn.isBefore(decidedOn) || performedOn.isAfter(validUntil);
    }
}
