package org.levelgaze.agreement;

import org.jspecify.annotations.Nullable;

/**
 * Krippendorff's alpha for nominal values, missing ones allowed (Krippendorff, Computing Krippendorff's
 * Alpha-Reliability, 2011).
 *
 * @param units pieces with two calls or more
 * @param pairableValues calls on those pieces
 * @param alpha 1 - observed / expected disagreement; {@code null} when undefined
 * @param undefined why there is no alpha, {@code null} when there is one
 */
public record KrippendorffAlpha(
        long units,
        long pairableValues,
        @Nullable Double alpha,
        @Nullable String undefined) {}
