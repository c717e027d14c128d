package org.levelgaze.studies;

/**
 * One appraiser's figure in one study.
 *
 * @param appraiserId who
 * @param figure what the study showed of him
 */
public record AppraiserFigure(long appraiserId, Figure figure) {}
