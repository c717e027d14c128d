package org.levelgaze.browser;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

/** One column for each appraiser and trial; what words mean is guessed where they say it, and asked where they do not. */
@InTheBrowser
class AWideFileTest {

    private static final String WORDS = """
            part;truth;WIDE-ANA 1;WIDE-ANA 2;WIDE-EVA 1;WIDE-EVA 2
            1;good;pass;pass;pass;fail
            2;good;pass;pass;pass;pass
            3;bad;fail;fail;fail;fail
            4;bad;fail;pass;fail;fail
            """;

    private static final String DIGITS = """
            piece,reference,NUM-ANA 1,NUM-ANA 2
            1,good,1,1
            2,good,1,0
            3,defective,0,0
            4,defective,0,0
            """;

    @Test
    void itsColumnsAreTakenForAppraisersAndTrials(Plant plant) {
        try (Desk desk = plant.engineer()) {
            bring(desk, WORDS);
            desk.newTask("WIDE-RIM", "Rim, wide");
            desk.newSet("WIDE-4");
            desk.type("Day of the study", "2026-05-04");
            assertThat(desk.holds("WIDE-EVA 2")).isEqualTo("call");
            assertThat(desk.holds("pass means")).isEqualTo("accept");
            assertThat(desk.holds("fail means")).isEqualTo("reject");
            desk.press("Read it all and store the study");
            desk.awaitImport();
            desk.choose("WIDE-ANA is", "person");
            desk.choose("WIDE-EVA is", "camera");
            desk.press("Enter them and store the study");
            desk.awaitImport();
            assertThat(desk.reads())
                    .contains("How does WIDE-ANA judge?", "How does WIDE-EVA judge?")
                    .contains("every call right on 3 of 4 pieces (75 %)")
                    .contains("4 pieces, 16 calls");
            desk.follow("WIDE-EVA over time");
            assertThat(desk.reads()).contains("What did the camera judge with?");
        }
    }

    @Test
    void oneAndNoughtAreAskedAndNeverGuessed(Plant plant) {
        try (Desk desk = plant.engineer()) {
            bring(desk, DIGITS);
            desk.newTask("NUM-RIM", "Rim, in digits");
            desk.newSet("NUM-4");
            desk.type("Day of the study", "2026-05-05");
            assertThat(desk.reads()).contains("1 and 0 are used both ways, so they are never guessed.");
            assertThat(desk.holds("1 means")).isEmpty();
            assertThat(desk.holds("0 means")).isEmpty();
            desk.press("Read it all and store the study");
            assertThat(desk.reads()).contains("Say what \"1\" means.", "Say what \"0\" means.");
            desk.choose("1 means", "accept");
            desk.choose("0 means", "reject");
            desk.press("Read it all and store the study");
            desk.awaitImport();
            desk.choose("NUM-ANA is", "slip");
            desk.press("Enter them and store the study");
            assertThat(desk.reads()).contains("Nothing was stored. Correct the file and bring it here");
        }
    }

    private static void bring(Desk desk, String content) {
        desk.open("/studies/import");
        desk.drop("The file", "wide.csv", content);
        desk.press("Look at it");
    }
}
