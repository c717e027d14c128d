package org.levelgaze.agreement;

import org.jspecify.annotations.Nullable;

/**
 * Fleiss' kappa: many raters, the same number on every piece (Fleiss, Psychol. Bull. 76 (1971) 378-382).
 *
 * @param pieces complete pieces
 * @param ratersPerPiece ratings per piece
 * @param kappa agreement beyond chance; {@code null} when undefined
 * @param seH0 standard error under kappa = 0 (Fleiss, Nee &amp; Landis, Psychol. Bull. 86 (1979) 974-977, which corrects the
 *     paper of 1971)
 * @param undefined why there is no kappa, {@code null} when there is one
 */
public record FleissKappa(
        long pieces,
        int ratersPerPiece,
        @Nullable Double kappa,
        @Nullable Double seH0,
        @Nullable String undefined) {}
