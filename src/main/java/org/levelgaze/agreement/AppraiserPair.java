package org.levelgaze.agreement;

/**
 * Whether two appraisers agree: same piece, same trial number, both judged. In JSON the figures of kappa stand beside the
 * two names.
 *
 * @param first code of the one
 * @param second code of the other
 * @param kappa Cohen's kappa between them; first word of the table = the first one's call, second = the second one's
 */
public record AppraiserPair(String first, String second, CohenKappa kappa) {}
