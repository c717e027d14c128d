package org.levelgaze.agreement;

/**
 * The size of a study.
 *
 * @param pieces all pieces scored
 * @param defectivePieces those that are defective
 * @param goodPieces those that are good
 * @param appraisers all appraisers, those without a call included
 * @param trials the largest number of trials of any appraiser
 * @param callsPlanned pieces x the sum of every appraiser's trials
 * @param callsMade calls that were made
 */
public record StudyShape(
        int pieces,
        int defectivePieces,
        int goodPieces,
        int appraisers,
        int trials,
        long callsPlanned,
        long callsMade) {

    static StudyShape of(Study study) {
        int defective = 0;
        for (boolean one : study.defective) {
            defective += one ? 1 : 0;
        }
        int most = 0;
        long all = 0;
        int appraisers = study.appraisers().size();
        for (int appraiser = 0; appraiser < appraisers; appraiser++) {
            most = Math.max(most, study.trials(appraiser));
            all += study.trials(appraiser);
        }
        int pieces = study.pieces().size();
        return new StudyShape(pieces, defective, pieces - defective, appraisers, most, pieces * all, study.calls());
    }
}
