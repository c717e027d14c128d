package org.levelgaze.browser;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

/** The job works without script, with the keyboard alone, in German, and each role sees what it may. */
@InTheBrowser
class ForEverybodyTest {

    @Test
    void aStudyIsImportedWithoutScript(Plant plant) {
        try (Desk desk = plant.engineerWithoutScript()) {
            desk.open("/studies/import");
            desk.drop("The file", "plain.csv", CallFiles.tenPieces("PLAIN-ANA"));
            desk.press("Look at it");
            desk.newTask("PLAIN-RIM", "Rim, plain");
            desk.newSet("PLAIN-10");
            desk.type("Day of the study", "2026-04-02");
            desk.press("Read it all and store the study");
            desk.awaitImport();
            desk.choose("PLAIN-ANA is", "person");
            desk.press("Enter them and store the study");
            desk.awaitImport();
            assertThat(desk.reads()).contains("How does PLAIN-ANA judge?", "9 of 10 pieces (90 %)");
        }
    }

    @Test
    void theKeyboardAloneReachesTheImport(Plant plant) {
        try (Desk desk = plant.engineer()) {
            desk.open("/");
            desk.key("Tab");
            assertThat(desk.focused()).isEqualTo("Skip to the content");
            desk.keyUntil("Tab", "Studies");
            desk.enter("/studies");
            desk.keyUntil("Tab", "Import a study");
            desk.enter("/studies/import");
        }
    }

    @Test
    void aProctorSeesStudiesButNeitherTrueStatesNorTheImport(Plant plant) {
        try (Desk engineer = plant.engineer()) {
            engineer.makeAccount("Pieter Holm", "pieter", "Proctor");
            engineer.open("/studies/import");
            engineer.drop("The file", "role.csv", CallFiles.tenPieces("ROLE-ANA"));
            engineer.press("Look at it");
            engineer.newTask("ROLE-RIM", "Rim, by role");
            engineer.newSet("ROLE-10");
            engineer.type("Day of the study", "2026-04-03");
            engineer.press("Read it all and store the study");
            engineer.awaitImport();
            engineer.choose("ROLE-ANA is", "person");
            engineer.press("Enter them and store the study");
            engineer.awaitImport();
            String study = engineer.path();
            try (Desk proctor = plant.desk()) {
                proctor.signIn("pieter");
                proctor.open(study);
                assertThat(proctor.reads())
                        .contains("How does ROLE-ANA judge?")
                        .doesNotContain("Which pieces were miscalled?", "Calls as CSV");
                proctor.open("/studies");
                assertThat(proctor.reads()).doesNotContain("Import a study");
                for (String closed : new String[] {study + "/pieces", "/sets/ROLE-10/key", "/studies/import"}) {
                    proctor.open(closed);
                    assertThat(proctor.reads())
                            .as(closed)
                            .contains("Your role may not open this", closed + " is open to other roles only");
                }
                proctor.open("/no-such-page");
                assertThat(proctor.reads()).contains("There is no such page");
            }
        }
    }
}
