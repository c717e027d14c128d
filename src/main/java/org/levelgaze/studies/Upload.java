package org.levelgaze.studies;

import java.time.Instant;
import java.util.Locale;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.levelgaze.shared.SiteId;

/**
 * A file on its way to a study.
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

        String word() {
            return name().toLowerCase(Locale.ROOT);
        }

        static State ofWord(String word) {
            return valueOf(word.toUpperCase(Locale.ROOT));
        }
    }

    /** How much of the file has been read, 0 to 100. */
    int percent() {
        return bytes == 0 ? 0 : (int) Math.min(100, bytesDone * 100 / bytes);
    }
}
