package org.levelgaze.agreement;

import org.jspecify.annotations.Nullable;

/**
 * Gwet's AC1 (Gwet, Br. J. Math. Stat. Psychol. 61 (2008) 29-48), accept and reject being the two categories, missing
 * calls allowed.
 *
 * @param units pieces with two calls or more; to the true state: calls
 * @param ac1 agreement beyond chance; {@code null} when undefined
 * @param observedAgreement mean share of agreeing pairs over those units
 * @param expectedAgreement the same by chance, from the mean share of each category over the pieces with one call or more
 * @param undefined why there is no AC1, {@code null} when there is one
 */
public record GwetAC1(
        long units,
        @Nullable Double ac1,
        @Nullable Double observedAgreement,
        @Nullable Double expectedAgreement,
        @Nullable String undefined) {

    static GwetAC1 toReference(CallTable table) {
        GwetSums sums = new GwetSums(2);
        sums.add(new int[] {0, 2}, table.rejectReject());
        sums.add(new int[] {1, 1}, table.rejectAccept() + table.acceptReject());
        sums.add(new int[] {2, 0}, table.acceptAccept());
        return sums.result();
    }
}
