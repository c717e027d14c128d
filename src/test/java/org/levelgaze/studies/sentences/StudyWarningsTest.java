package org.levelgaze.studies.sentences;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.LocalDate;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Test;

class StudyWarningsTest {

    private static final LocalDate DAY = LocalDate.of(2027, 3, 12);
    private static final LocalDate DECIDED = LocalDate.of(2027, 1, 15);
    private static final LocalDate NEXT_YEAR = DECIDED.plusMonths(12);

    /** Common practice, no source: with 2 defective pieces, one mistake is 50 %. */
    @Test
    void saysWhatOneMistakeIsInAnUnbalancedSet() {
        assertThat(warnings(2, 48, 2, 0, false, NEXT_YEAR))
                .first()
                .isEqualTo("Only 2 defective pieces among 50: one mistake on them is 50 %.");
        assertThat(warnings(48, 1, 2, 0, false, NEXT_YEAR))
                .first()
                .isEqualTo("Only one good piece among 49: one mistake on it is 100 %.");
    }

    /** Common practice, no source: half of the pieces defective, ten points more or less. */
    @Test
    void takesFortyToSixtyPerCentAsBalanced() {
        assertThat(warnings(20, 30, 2, 0, false, NEXT_YEAR)).hasSize(1);
        assertThat(warnings(30, 20, 2, 0, false, NEXT_YEAR)).hasSize(1);
        assertThat(warnings(19, 31, 2, 0, false, NEXT_YEAR)).hasSize(2);
    }

    @Test
    void saysThatTheSetWasOutOfDateAndThatItsTruthsCameWithAFile() {
        assertThat(warnings(25, 25, 2, 0, true, DAY.minusDays(1)))
                .containsExactly(
                        "The set G-04 was not in date on 12 Mar 2027: its true states hold from 15 Jan 2027 to 11 Mar"
                                + " 2027. This study proves nothing about an appraiser.",
                        "The true states of G-04 came with a file of calls. Nobody has adjudicated them, so a"
                                + " \"mistake\" may be a mistake of the file.",
                        "50 % of these pieces are defective. On the line there are fewer, and people miss more where"
                                + " defects are rare: expect more to get through than here.");
        assertThat(warnings(25, 25, 2, 0, false, DAY)).hasSize(1);
    }

    @Test
    void warnsOfIntervalsThatCountCallsFromTheFourthLookOn() {
        assertThat(warnings(25, 25, 3, 0, false, DAY)).hasSize(1);
        assertThat(warnings(25, 25, 4, 0, false, DAY))
                .first()
                .asString()
                .startsWith("Pieces were looked at up to 4 times.");
    }

    @Test
    void countsMissingCallsAndFewPieces() {
        assertThat(warnings(10, 9, 2, 1, false, DAY))
                .startsWith(
                        "19 pieces are few: at least 20 are usual. Read every share with its interval.",
                        "One call is missing. Where a call is missing, the piece does not count as judged every time.");
        assertThat(warnings(10, 10, 2, 14, false, DAY)).first().asString().startsWith("14 calls are missing.");
    }

    private static List<String> warnings(
            int defective, int good, int trials, long missing, boolean imported, LocalDate validUntil) {
        StudyFacts facts =
                new StudyFacts(defective, good, 0, trials, missing, "G-04", imported, DAY, DECIDED, validUntil);
        return StudyWarnings.of(facts, UsualLimits.COMMON_PRACTICE, Tried.words(Locale.ENGLISH)).stream()
                .map(warning -> warning.replace('\u00a0', ' '))
                .toList();
    }
}
