package org.levelgaze.site;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.authentication;
import static org.springframework.security.test.web.servlet.setup.SecurityMockMvcConfigurers.springSecurity;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;

import jakarta.servlet.RequestDispatcher;
import jakarta.servlet.http.Cookie;
import java.net.URI;
import java.util.Locale;
import java.util.Objects;
import java.util.Set;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.levelgaze.access.Caller;
import org.levelgaze.access.Role;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.SiteId;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import org.springframework.test.web.servlet.setup.MockMvcBuilders;
import org.springframework.web.context.WebApplicationContext;

@SpringBootTest
@WithDatabase
class ShellTest {

    @Autowired
    WebApplicationContext context;

    private MockMvcTester pages = MockMvcTester.of();

    @BeforeEach
    void open() {
        pages = MockMvcTester.create(MockMvcBuilders.webAppContextSetup(context)
                .apply(springSecurity())
                .defaultRequest(get("/").with(authentication(ana(Role.ADMINISTRATOR))))
                .build());
    }

    /** At a site without studies, so that what other tests leave behind does not matter. */
    private static Caller ana(Role role) {
        return Caller.person(new Actor(new SiteId(9), "account:1"), "Ana Reyes", Set.of(role));
    }

    @Test
    void showsThePlacesThatTheRoleMayOpen() {
        assertThat(pages.get().uri("/"))
                .bodyText()
                .contains("href=\"/studies\"", "href=\"/journal\"", "href=\"/settings\"")
                .contains("<a href=\"/\" aria-current=\"page\">");
        assertThat(pages.get().uri("/").with(authentication(ana(Role.PROCTOR))))
                .bodyText()
                .contains("href=\"/studies\"")
                .doesNotContain("href=\"/journal\"", "href=\"/settings\"");
    }

    @Test
    void anEmptyInstallationSaysWhereToBegin() {
        assertThat(pages.get().uri("/").locale(Locale.ENGLISH))
                .bodyText()
                .contains("There is no study yet.", "href=\"/studies/import\"")
                .doesNotContain("A good day");
    }

    @Test
    void anEmptyDayIsAGoodDay() {
        assertThat(pages.get().uri("/").with(authentication(ana(Role.PROCTOR))).locale(Locale.ENGLISH))
                .hasStatusOk()
                .bodyText()
                .contains("<html lang=\"en\"", "A good day", "Skip to the content", "Ana Reyes", "Sign out")
                .contains("name=\"_csrf\"");
    }

    @Test
    void speaksGermanToABrowserThatAsksForIt() {
        assertThat(pages.get().uri("/").with(authentication(ana(Role.PROCTOR))).locale(Locale.GERMANY))
                .bodyText()
                .contains("<html lang=\"de\"", "Ein guter Tag");
    }

    @Test
    void keepsTheLanguageChosenOnAPage() {
        var chosen = pages.get().uri("/?lang=de").locale(Locale.ENGLISH).exchange();
        Cookie cookie = Objects.requireNonNull(chosen.getResponse().getCookie("language"));
        assertThat(pages.get().uri("/").locale(Locale.ENGLISH).cookie(cookie))
                .bodyText()
                .contains("<html lang=\"de\"");
    }

    @Test
    void takesNoLanguageWithoutTexts() {
        assertThat(pages.get().uri("/?lang=fr").locale(Locale.GERMAN))
                .bodyText()
                .contains("<html lang=\"en\"");
    }

    @Test
    void keepsTheBrightnessChosenOnAPage() {
        assertThat(pages.get().uri("/?theme=dark")).bodyText().contains("data-theme=\"dark\"");
        assertThat(pages.get().uri("/").cookie(new Cookie("theme", "dark")))
                .bodyText()
                .contains("data-theme=\"dark\"");
        assertThat(pages.get().uri("/").cookie(new Cookie("theme", "\"><b>")))
                .bodyText()
                .contains("data-theme=\"system\"");
    }

    @Test
    void switchingKeepsTheOtherParametersOfTheAddress() {
        assertThat(pages.get().uri(URI.create("/?from=2026-01-01&q=rim%20a")).locale(Locale.ENGLISH))
                .bodyText()
                .contains("href=\"?from=2026-01-01&amp;q=rim%20a&amp;lang=de\"");
    }

    @Test
    void aFailureNamesTheAddressAndTheWayOut() {
        assertThat(pages.get()
                        .uri("/error")
                        .locale(Locale.ENGLISH)
                        .requestAttr(RequestDispatcher.ERROR_STATUS_CODE, 404)
                        .requestAttr(RequestDispatcher.ERROR_REQUEST_URI, "/studis/<7>"))
                .hasStatus(404)
                .bodyText()
                .contains(
                        "There is no such page",
                        "/studis/&lt;7&gt;",
                        "href=\"?lang=de\"",
                        "Back to Today",
                        "Status 404");
    }
}
