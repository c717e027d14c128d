package org.levelgaze.sets;

import java.time.Instant;

/**
 * Somebody has seen the true states of an edition.
 *
 * @param who the account or token, as in the journal
 * @param at the first time
 * @param page where
 */
public record KeyReading(String who, Instant at, String page) {}
