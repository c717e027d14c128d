package org.levelgaze.studies;

import java.util.Map;
import java.util.Optional;
import org.levelgaze.register.AppraiserKind;

/**
 * What the user has said yes to beforehand: a slip of the pen must not make a new person.
 *
 * @param newSet an unknown set may be made from the file's true states
 * @param newKinds defect kinds that the task does not have may be added to it
 * @param anyAppraiser every unknown appraiser may be entered, as a person
 * @param newAppraisers these unknown appraisers may be entered, as the kind given
 * @param repeat the same bytes may be stored once more for the same task, set and day
 */
public record Consent(
        boolean newSet,
        boolean newKinds,
        boolean anyAppraiser,
        Map<String, AppraiserKind> newAppraisers,
        boolean repeat) {

    /** Nothing new. */
    public static final Consent NOTHING = new Consent(false, false, false, Map.of(), false);

    /** Everything new that the file brings, but no repeat. */
    public static final Consent EVERYTHING_NEW = new Consent(true, true, true, Map.of(), false);

    /** Keeps its own copy of the appraisers. */
    public Consent {
        newAppraisers = Map.copyOf(newAppraisers);
    }

    /** As what an unknown appraiser may be entered, if at all. */
    Optional<AppraiserKind> enterAs(String word) {
        AppraiserKind said = newAppraisers.get(word);
        if (said != null) {
            return Optional.of(said);
        }
        return anyAppraiser ? Optional.of(AppraiserKind.PERSON) : Optional.empty();
    }
}
