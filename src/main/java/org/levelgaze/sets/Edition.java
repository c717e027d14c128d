package org.levelgaze.sets;

import java.time.LocalDate;

/**
 * A frozen membership of a set with its true states; this record carries no true state of a piece.
 *
 * @param setId the set
 * @param number 1, 2, 3, … in the order of recording
 * @param decidedOn the day on which the true states were decided
 * @param decidedBy who decided them, as written
 * @param validUntil the last day in date
 * @param basis what the true states rest on
 * @param pieces how many pieces it holds
 * @param defective how many of them are defective
 * @param grey how many of them are undecided
 */
public record Edition(
        long setId,
        int number,
        LocalDate decidedOn,
        String decidedBy,
        LocalDate validUntil,
        Basis basis,
        int pieces,
        int defective,
        int grey) {

    /** Pieces that are good. */
    public int good() {
        return pieces - defective - grey;
    }

    /** Whether the edition is in date on this day. */
    public boolean inDateOn(LocalDate day) {
        return !day.isBefore(decidedOn) && !day.isAfter(validUntil);
    }
}
