package org.levelgaze.browser;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.springframework.context.support.ResourceBundleMessageSource;

/** The whole way in German, with the words of the bundles. */
@InTheBrowser
class InGermanTest {

    private final ResourceBundleMessageSource bundles = new ResourceBundleMessageSource();

    InGermanTest() {
        bundles.setBasenames("messages/site", "messages/access", "messages/studies");
        bundles.setDefaultEncoding("UTF-8");
        bundles.setFallbackToSystemLocale(false);
    }

    @Test
    void aFileBecomesFindingsInGerman(Plant plant) {
        try (Desk desk = plant.germanDesk()) {
            desk.open("/sign-in");
            desk.type(german("access.loginName"), Plant.ENGINEER);
            desk.type(german("access.password"), Plant.PASSWORD);
            desk.press(german("access.signIn.button"));
            desk.open("/?lang=de");
            assertThat(desk.reads()).contains(german("site.today.heading"));
            desk.follow(german("site.place.studies"));
            desk.open("/studies/import");
            desk.drop(german("studies.import.file"), "german.csv", germanCalls());
            desk.press(german("studies.import.bring"));
            desk.choose(german("studies.import.task"), "new");
            desk.type(german("studies.import.task.code"), "DE-RAND");
            desk.type(german("studies.import.task.name"), "Rand der Becher");
            desk.choose(german("studies.import.set"), "new");
            desk.type(german("studies.import.set.code"), "DE-10");
            desk.type(german("studies.import.day"), "2026-04-08");
            desk.press(german("studies.import.store"));
            desk.awaitImport();
            desk.choose(german("studies.import.ask.who", "DE-ANA"), "person");
            desk.press(german("studies.import.ask.store"));
            desk.awaitImport();
            assertThat(desk.reads())
                    .contains(german("studies.page.appraiser", "DE-ANA"))
                    .contains("9 von 10", "90 %")
                    .contains(german("studies.page.numbers"));
            desk.follow(german("studies.page.summary"));
            assertThat(desk.reads()).contains(german("studies.summary.asked"), german("studies.summary.allows"));
        }
    }

    private static String germanCalls() {
        return CallFiles.tenPieces("DE-ANA")
                .replace(',', ';')
                .replace("piece;reference;appraiser;trial;call", "Teil;Soll;Prüfer;Durchgang;Urteil")
                .replace("defective", "schlecht")
                .replace("good", "gut")
                .replace("accept", "io")
                .replace("reject", "nio");
    }

    private String german(String key, Object... arguments) {
        return bundles.getMessage(key, arguments, Locale.GERMAN).replace('\u00a0', ' ');
    }
}
