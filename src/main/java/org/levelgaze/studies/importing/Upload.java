package org.levelgaze.studies.importing;

import java.time.Instant;
import java.util.Locale;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.levelgaze.shared.SiteId;

/**
 * A file on its way to a study. Public methods are called by templates.
 *
 * @param site where
 * @param id its number, not to be guessed
 * @param fileName as the user's machine calls it
 * @param bytes how large it is
 * @param uploadedAt when it came
 * @param state where things stand
 * @param request what the user said it means, as JSON; null before that
 * @param rowsDone rows read in the run under way or the last one
 * @param bytesDone bytes read in the run under way or the last one
 * @param callsInAll calls to store, once the file is read, and {@code rowsDone} then counts calls; null before that
 * @param run the number of the run under way or the last one
 * @param studyId the study it became; null before that
 * @param problem why the last run stored nothing, as JSON; null: no such run
 */
record Upload(
        SiteId site,
        UUID id,
        String fileName,
        long bytes,
        Instant uploadedAt,
        State state,
        @Nullable String request,
        long rowsDone,
        long bytesDone,
        @Nullable Long callsInAll,
        int run,
        @Nullable Long studyId,
        @Nullable String problem) {

    /** Where an upload stands. */
    enum State {
        /** For the user to say what it means. */
        WAITING,
        /** It is being read. */
        RUNNING,
        /** It became a study. */
        DONE,
        /** It was read, and nothing was stored: the problem says why. */
        REFUSED,
        /** The user stopped the run. */
        CANCELLED,
        /** The program stopped during the run. */
        BROKEN;

        public String word() {
            return name().toLowerCase(Locale.ROOT);
        }

        static State ofWord(String word) {
            return valueOf(word.toUpperCase(Locale.ROOT));
        }
    }

    /** How far the reading or the storing is, 0 to 100. */
    public int percent() {
        long whole = callsInAll == null ? bytes : callsInAll;
        long part = callsInAll == null ? bytesDone : rowsDone;
        return whole == 0 ? 0 : (int) Math.min(100, part * 100 / whole);
    }

    /** Whether the file is read and its calls are being stored. */
    public boolean storing() {
        return callsInAll != null;
    }

    public boolean running() {
        return state == State.RUNNING;
    }
}
