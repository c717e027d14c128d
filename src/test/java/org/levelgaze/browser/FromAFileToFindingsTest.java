package org.levelgaze.browser;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.util.List;
import org.dhatim.fastexcel.reader.ReadableWorkbook;
import org.dhatim.fastexcel.reader.Sheet;
import org.junit.jupiter.api.Test;

/**
 * The main job, from a file of calls to findings that are found again the next day. The figures are those printed for the
 * attribute study in AIAG, Measurement Systems Analysis, 4th ed. (from memory; see README of the reference values).
 */
@InTheBrowser
class FromAFileToFindingsTest {

    @Test
    void aFileOfCallsBecomesFindingsThatAreFoundAgainTomorrow(Plant plant) throws IOException {
        String study;
        try (Desk desk = plant.engineer()) {
            study = bringTheFile(desk);
            saysWhatTheBookSays(desk);
            countsTheBringerAmongThoseWhoKnowTheKey(desk, study);
            sumsUpOnOnePage(desk, study);
            canBeTakenAlong(desk, study);
            desk.press("Sign out");
            assertThat(desk.reads()).contains("You are signed out.");
        }
        try (Desk auditor = plant.desk()) {
            auditor.signIn("olga");
            opensTheKeyOnlyAfterAYes(auditor, study);
        }
        plant.restart();
        try (Desk tomorrow = plant.engineer()) {
            isFoundAgain(tomorrow, study);
        }
    }

    private static String bringTheFile(Desk desk) {
        desk.open("/");
        desk.follow("Studies");
        desk.follow("Import a study");
        desk.drop("The file", "calls.csv", CallFiles.published("aiag_msa4_calls.csv"));
        desk.press("Look at it");
        assertThat(desk.reads()).contains("You brought calls.csv.");
        desk.newTask("GAGE", "Gage of the book");
        desk.newSet("BOOK-50");
        desk.type("Day of the study", "2026-03-12");
        desk.press("Read it all and store the study");
        desk.awaitImport();
        assertThat(desk.reads()).contains("May these be entered?", "calls.csv can be read.");
        desk.choose("A is", "person");
        desk.choose("B is", "person");
        desk.choose("C is", "person");
        desk.press("Enter them and store the study");
        desk.awaitImport();
        assertThat(desk.path()).matches("/studies/\\d+");
        return desk.path();
    }

    private static void saysWhatTheBookSays(Desk desk) {
        assertThat(desk.reads())
                .contains("What did the study of 12 Mar 2026 show?")
                .contains("How does A judge?", "How does B judge?", "How does C judge?")
                .as("right in every trial: 42, 45 and 40 of 50, that is 84, 90 and 80 %")
                .contains("every call right on 42 of 50 pieces (84 %)")
                .contains("every call right on 45 of 50 pieces (90 %)")
                .contains("every call right on 40 of 50 pieces (80 %)")
                .as("limits of A 71 and 93 %, of B 78 and 97 %, of C 66 and 90 %")
                .contains("70.9 % to 92.8 %", "78.2 % to 96.7 %", "66.3 % to 90 %");
    }

    /** Who brought the true states knows them, and the set says so. */
    private static void countsTheBringerAmongThoseWhoKnowTheKey(Desk desk, String study) {
        desk.follow("Which pieces were miscalled?");
        assertThat(desk.reads()).contains("You count as having seen the answer key of BOOK-50, edition 1");
        desk.open("/sets/BOOK-50");
        assertThat(desk.reads()).contains("Who has seen the answer key?", "account:1");
        desk.makeAccount("Olga Lund", "olga", "Auditor");
        desk.open(study);
    }

    /** Anybody else is asked first, and nothing of the key is shown before the yes. */
    private static void opensTheKeyOnlyAfterAYes(Desk desk, String study) {
        desk.open(study);
        desk.follow("Which pieces were miscalled?");
        assertThat(desk.reads())
                .contains("This page shows the true state of every piece of BOOK-50, edition 1.")
                .doesNotContain("True state", "Miscalled");
        desk.press("Open and record it");
        assertThat(desk.path()).isEqualTo(study + "/pieces");
        assertThat(desk.reads())
                .contains("You count as having seen the answer key of BOOK-50, edition 1", "True state", "Miscalled")
                .as("pieces 6, 21, 22 and 34 are called wrongly most often, in 4 of 9 calls: counted from the file")
                .containsSubsequence("\n6\n", "\n21\n", "\n22\n", "\n34\n", "4 of 9");
        desk.open("/sets/BOOK-50");
        assertThat(desk.reads()).contains(study + "/pieces");
    }

    private static void sumsUpOnOnePage(Desk desk, String study) {
        desk.open(study);
        desk.follow("Summary on one page");
        assertThat(desk.reads())
                .contains("What was asked?", "What was found?", "What does that allow?")
                .contains("Task: Gage of the book. Each of 50 pieces of the reference set BOOK-50")
                .contains("not everybody here may be relied on")
                .doesNotContainIgnoringCase("kappa");
    }

    private static void canBeTakenAlong(Desk desk, String study) throws IOException {
        desk.open(study);
        assertThat(desk.takeText("Findings as JSON")).contains("\"effectiveness\"");
        try (ReadableWorkbook book =
                new ReadableWorkbook(new ByteArrayInputStream(desk.take("Calls and findings as a spreadsheet")))) {
            assertThat(book.getSheets().map(Sheet::getName)).isNotEmpty();
        }
        String calls = desk.takeText("Calls as CSV");
        desk.open("/studies/import");
        desk.drop("The file", "taken-along.csv", calls);
        desk.press("Look at it");
        desk.choose("Task", "GAGE · Gage of the book");
        desk.choose("Reference set", "BOOK-50");
        desk.type("Day of the study", "2026-06-12");
        desk.press("Read it all and store the study");
        desk.awaitImport();
        assertThat(desk.path()).matches("/studies/\\d+").isNotEqualTo(study);
        assertThat(desk.reads())
                .contains("What did the study of 12 Jun 2026 show?", "every call right on 42 of 50 pieces (84 %)");
    }

    private static void isFoundAgain(Desk desk, String study) {
        desk.follow("Studies");
        desk.choose("Task", "Gage of the book");
        desk.press("Show");
        assertThat(desk.reads()).contains("2 studies", "12 Mar 2026", "12 Jun 2026", "Gage of the book");
        desk.follow("12 Mar 2026");
        assertThat(desk.path()).isEqualTo(study);
        desk.follow("C over time");
        assertThat(desk.reads())
                .contains("How does C judge over time?")
                .contains("Newest study, 12 Jun 2026: every call right on 40 of 50 pieces");
        for (String place : List.of("Appraisers", "Tasks", "Reference sets", "Journal", "Settings")) {
            desk.follow(place);
        }
    }
}
