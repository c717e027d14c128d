package org.levelgaze.browser;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

/** A file that cannot be taken says why, row by row; nothing of it stays, and nothing has to be said twice. */
@InTheBrowser
class ABadFileTest {

    @Test
    void everyBadRowIsNamedAndTheCorrectedFileGoesThrough(Plant plant) {
        String good = CallFiles.tenPieces("BAD-ANA");
        String bad = good.replace("D3,defective,BAD-ANA,2,reject", "D3,defective,BAD-ANA,two,reject")
                .replace("G4,good,BAD-ANA,2,accept", "G4,defective,BAD-ANA,2,accept");
        try (Desk desk = plant.engineer()) {
            bring(desk, bad);
            desk.newTask("BAD-RIM", "Rim of bad files");
            desk.newSet("BAD-10");
            desk.type("Day of the study", "2026-04-01");
            desk.press("Read it all and store the study");
            desk.awaitImport();

            assertThat(desk.reads())
                    .contains("2 rows cannot be taken. Nothing was imported.")
                    .contains("16\ttrial\ttwo\ttrial 'two' is not a whole number")
                    .containsPattern(
                            "19\treference\tdefective\treference of piece 'G4' is 'defective' here and 'good' in row 9");
            assertThat(desk.takeText("Download all 2 rows to correct (CSV)")).contains("16", "two", "19", "G4");
            assertThat(desk.holds("Code of the new task")).isEqualTo("BAD-RIM");
            assertThat(desk.holds("Code of the new set")).isEqualTo("BAD-10");
            assertThat(desk.holds("Day of the study")).isEqualTo("2026-04-01");
            String refused = desk.path();
            desk.open("/tasks");
            assertThat(desk.reads()).as("nothing was entered").doesNotContain("BAD-RIM");
            desk.open("/");
            assertThat(desk.reads()).contains("Your file \"bad.csv\" waits for a decision");
            desk.open(refused);

            desk.follow("Bring a corrected file instead");
            desk.drop("The file", "good.csv", good);
            desk.press("Look at it");
            assertThat(desk.holds("Code of the new task")).isEqualTo("BAD-RIM");
            desk.press("Read it all and store the study");
            desk.awaitImport();
            desk.choose("BAD-ANA is", "person");
            desk.press("Enter them and store the study");
            desk.awaitImport();
            assertThat(desk.reads()).contains("every call right on 9 of 10 pieces (90 %)");
        }
    }

    @Test
    void aFileThatIsNoTableIsRefusedAtOnce(Plant plant) {
        try (Desk desk = plant.engineer()) {
            bring(desk, "");
            assertThat(desk.reads()).contains("The file is empty.");
            bring(desk, "piece,\"call\nD1,reject\n");
            assertThat(desk.reads()).contains("Row 1: a quote is opened and not closed");
        }
    }

    @Test
    void whatWasLeftOutIsAskedForBesideItsField(Plant plant) {
        try (Desk desk = plant.engineer()) {
            bring(desk, CallFiles.tenPieces("LEFT-ANA"));
            desk.press("Read it all and store the study");
            assertThat(desk.reads())
                    .contains("answers are missing or do not fit")
                    .contains("Choose the set that was judged, or \"A new set\".", "Give the day of the study.");
            desk.press("Take this file away again");
            assertThat(desk.path()).isEqualTo("/studies/import");
        }
    }

    private static void bring(Desk desk, String content) {
        desk.open("/studies/import");
        desk.drop("The file", "bad.csv", content);
        desk.press("Look at it");
    }
}
