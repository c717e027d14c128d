package org.levelgaze.agreement;

/**
 * Finding and naming one defect kind, two skills (practitioners score them apart).
 *
 * @param kind the true kind
 * @param detected rejects, for whatever reason, out of calls on pieces of this kind
 * @param named calls that named this kind, out of those rejects; 0 of 0 when no call of the study names any kind
 */
public record DefectKindFindings(String kind, Share detected, Share named) {}
