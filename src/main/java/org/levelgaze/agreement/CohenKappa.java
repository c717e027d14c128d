package org.levelgaze.agreement;

import org.jspecify.annotations.Nullable;

/**
 * Cohen's kappa of a 2x2 table (Cohen, Educ. Psychol. Meas. 20 (1960) 37-46), to be shown with its table.
 *
 * @param n calls in the table
 * @param table the table
 * @param kappa agreement beyond chance, at most 1; {@code null} when undefined
 * @param se its standard error, not under kappa = 0 (Fleiss, Cohen &amp; Everitt, Psychol. Bull. 72 (1969) 323-327)
 * @param interval kappa -/+ z x se, not cut at 1
 * @param seH0 standard error for the test kappa = 0 alone (same paper)
 * @param observedAgreement share of calls on the diagonal, {@code null} at n = 0
 * @param expectedAgreement share on the diagonal by chance, from the margins, {@code null} at n = 0
 * @param undefined why there is no kappa, {@code null} when there is one
 */
public record CohenKappa(
        long n,
        CallTable table,
        @Nullable Double kappa,
        @Nullable Double se,
        @Nullable Interval interval,
        @Nullable Double seH0,
        @Nullable Double observedAgreement,
        @Nullable Double expectedAgreement,
        @Nullable String undefined) {

    private static final String NO_CALL = "there is no call";
    private static final String CHANCE_IS_ONE = "chance agreement is 1: both always gave the same call";

    static CohenKappa of(CallTable table, double z) {
        long n = table.total();
        if (n == 0) {
            return new CohenKappa(n, table, null, null, null, null, null, null, NO_CALL);
        }
        KappaMoments moments = KappaMoments.of(
                new long[][] {{table.rejectReject(), table.rejectAccept()}, {table.acceptReject(), table.acceptAccept()}
                });
        if (moments.chanceIsOne()) {
            return new CohenKappa(
                    n, table, null, null, null, null, moments.observed(), moments.expected(), CHANCE_IS_ONE);
        }
        double kappa = moments.kappa();
        double se = moments.standardError();
        return new CohenKappa(
                n,
                table,
                kappa,
                se,
                Interval.around(kappa, z * se),
                moments.standardErrorUnderNull(),
                moments.observed(),
                moments.expected(),
                null);
    }
}
