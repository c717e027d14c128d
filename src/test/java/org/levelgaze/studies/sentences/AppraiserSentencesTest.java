package org.levelgaze.studies.sentences;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Locale;
import java.util.Objects;
import org.junit.jupiter.api.Test;

/** What is said of one appraiser, read as it stands on the page (the no-break space before % read as a space). */
class AppraiserSentencesTest {

    /** Common practice, no source: 18 of 20 right is 90 %; the exact interval is that of Clopper and Pearson 1934. */
    @Test
    void saysWhatAStudyOfTwentyPiecesLeavesOpen() {
        InWords said = new Tried(10, 10, 2, 1, 1).inWords();

        assertThat(plain(said.sure()))
                .isEqualTo("A study of 20 pieces with 90 % right leaves 68 % to 99 % open (exact interval, 95 %)."
                        + " The usual limit of 80 % lies inside, so this study alone does not settle it.");
    }

    @Test
    void saysWhatWasHeldAndWhatIsWorthARemark() {
        InWords said = new Tried(10, 10, 2, 1, 0).inWords();

        assertThat(said.isHeld()).isTrue();
        assertThat(plain(said.effective()))
                .isEqualTo("Ana is effective by the usual limits, with a remark: every call right on 19 of 20 pieces"
                        + " (95 %); 1 of 20 calls on defective pieces let one through (5 %, above 2 % is worth a"
                        + " remark).");
    }

    @Test
    void theWorstOfThreeLimitsDecidesAndEachIsNamed() {
        InWords said = new Tried(10, 10, 1, 1, 2).inWords();

        assertThat(said.isHeld()).isFalse();
        assertThat(plain(said.effective()))
                .isEqualTo("Ana is not effective by the usual limits: every call right on 17 of 20 pieces (85 %);"
                        + " below 90 % is worth a remark; 1 of 10 calls on defective pieces let one through (10 %, at"
                        + " most 5 % is usual); 2 of 10 calls on good pieces refused one (20 %, at most 10 % is"
                        + " usual).");
        assertThat(said.next()).anyMatch(step -> step.startsWith("Look first at the pieces that Ana miscalled."));
    }

    /** Common practice, no source: 1 of 10 good pieces refused against 2 of 10 defective ones let through is 0.5. */
    @Test
    void asksToRefreshTheStandardWhereTheBiasRatioIsBelowOneThoughItMayBeChance() {
        InWords said = new Tried(10, 10, 1, 2, 1).inWords();

        assertThat(plain(said.lean() + " " + said.ratio()))
                .startsWith("Which way the mistakes of Ana go stays open: 20 % of the calls on defective"
                        + " pieces and 10 % on good pieces were wrong. The bias ratio of 0.50 (")
                .endsWith("is not distinguishable from even.");
        assertThat(said.next().get(0)).startsWith("Refresh the standard with Ana: a bias ratio of 0.50 is below 1");
    }

    /** An unbalanced flawless study has c above 0 (10 of 10 and 0 of 170 give +0.53), and still no lean. */
    @Test
    void neverSaysThatSomebodyWithoutAMistakeLeans() {
        InWords said = new Tried(10, 170, 1, 0, 0).inWords();

        assertThat(said.lean()).isEqualTo("Ana made no mistake, so nothing shows a lean.");
        assertThat(said.ratio()).isEmpty();
    }

    @Test
    void saysLenientOnlyWhereTheIntervalOfCExcludesZero() {
        assertThat(new Tried(40, 40, 1, 16, 1).inWords().lean())
                .startsWith("Ana leans lenient and lets defects out: 40");
        assertThat(new Tried(40, 40, 1, 1, 16).inWords().lean())
                .startsWith("Ana leans strict and keeps good ones back: 3");
        assertThat(new Tried(40, 40, 1, 4, 3).inWords().lean())
                .startsWith("Which way the mistakes of Ana go stays open");
    }

    /** 0 of 30 against 4 of 30: the ratio is 1.11 or more at 95 %, while the interval of c holds 0. */
    @Test
    void saysWhereTheBiasRatioDiffersFromEvenAndTheScaleDoesNotBearItOut() {
        InWords said = new Tried(15, 15, 2, 0, 4).inWords();

        assertThat(plain(said.lean() + " " + said.ratio()))
                .isEqualTo("Which way the mistakes of Ana go stays open: 0 % of the calls on defective pieces and 13 %"
                        + " on good pieces were wrong. No defective piece was let through, and the bias ratio (1.11 or"
                        + " more) differs from even. The scale c does not bear that out: its interval holds 0.");
    }

    @Test
    void saysWhatIsMissingInsteadOfAVerdict() {
        InWords said = new Tried(0, 20, 2, 0, 0).inWords();

        assertThat(said.isHeld()).isFalse();
        assertThat(said.effective())
                .isEqualTo("Whether Ana is effective stays open: there is no call on a defective piece.");
        assertThat(said.next().get(0)).startsWith("Add defective pieces to the set");
    }

    @Test
    void explainsALowKappaBesideAHighAgreement() {
        String said = Objects.requireNonNull(new Tried(2, 48, 1, 1, 2).inWords().kappa());

        assertThat(plain(said))
                .startsWith("The kappa of Ana is only 0.37 although 94 % of the calls agree with the true state.");
        assertThat(new Tried(25, 25, 1, 1, 2).inWords().kappa()).isNull();
    }

    @Test
    void saysHowManyPiecesWouldSettleIt() {
        InWords said = new Tried(10, 10, 2, 1, 1).inWords();

        assertThat(plain(String.join("\n", said.next())))
                .contains("at the same share, about 70 of them would settle on which side of 80 % the truth lies");
    }

    @Test
    void asksAPersonForASecondTrialAndACameraForASteadyPicture() {
        assertThat(new Tried(30, 30, 1, 0, 0).inWords().next())
                .singleElement()
                .asString()
                .startsWith("Let Ana judge the pieces a second time");
        assertThat(new Tried(30, 30, 1, 0, 0).inWords(true, Locale.ENGLISH).next())
                .singleElement()
                .asString()
                .startsWith("Let Ana judge the pieces several times");
        assertThat(new Tried(30, 30, 3, 0, 1).inWords(true, Locale.ENGLISH).next())
                .anyMatch(step -> step.startsWith("Ana called 1 of 60 pieces differently from trial to trial."));
        assertThat(new Tried(30, 30, 2, 0, 0).inWords().next())
                .containsExactly("Nothing in this study asks for action.");
    }

    @Test
    void writesTheSameInGerman() {
        InWords said = new Tried(10, 10, 2, 1, 1).inWords(false, Locale.GERMAN);

        assertThat(plain(said.sure()))
                .isEqualTo("Eine Studie mit 20 Teilen, davon 90 % richtig, lässt 68 % bis 99 % offen (exaktes"
                        + " Intervall, 95 %). Die übliche Grenze von 80 % liegt darin, also entscheidet diese Studie"
                        + " allein sie nicht.");
        assertThat(said.ratio()).contains("Verzerrungsverhältnis von 1,00");
    }

    private static String plain(String sentence) {
        return sentence.replace('\u00a0', ' ');
    }
}
