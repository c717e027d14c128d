package org.levelgaze.agreement;

/**
 * How often an appraiser is right (AIAG, Measurement Systems Analysis, 4th ed., attribute study, from memory; common
 * practice). By piece it falls as the number of trials grows.
 *
 * @param byPiece pieces with every call right, out of the pieces that he judged in each of his trials
 * @param byPieceAnyCalls pieces with every made call right, out of the pieces that he judged at all
 * @param byCall right calls out of calls made
 */
public record Effectiveness(Share byPiece, Share byPieceAnyCalls, Share byCall) {}
