package org.levelgaze.journal;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.setup.SecurityMockMvcConfigurers.springSecurity;

import java.util.Locale;
import java.util.stream.IntStream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.levelgaze.access.Role;
import org.levelgaze.access.Scope;
import org.levelgaze.shared.SiteId;
import org.levelgaze.testing.As;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import org.springframework.test.web.servlet.setup.MockMvcBuilders;
import org.springframework.transaction.support.TransactionTemplate;
import org.springframework.web.context.WebApplicationContext;

@SpringBootTest
@WithDatabase
class JournalPagesTest {

    @Autowired
    WebApplicationContext context;

    @Autowired
    Journal journal;

    @Autowired
    TransactionTemplate transaction;

    private MockMvcTester pages = MockMvcTester.of();
    private long before;

    @BeforeEach
    void fiftyOneEntriesMore() {
        pages = MockMvcTester.create(MockMvcBuilders.webAppContextSetup(context)
                .apply(springSecurity())
                .build());
        before = journal.verify(SiteId.MAIN).entries();
        transaction.executeWithoutResult(status -> IntStream.rangeClosed(1, 101)
                .forEach(i ->
                        journal.record(Actor.system(SiteId.MAIN), Act.of("glaze.mixed", "batch:" + (before + i), ""))));
    }

    @Test
    void showsTheNewestFiftyAndTheWayToOlderOnes() {
        assertThat(pages.get().uri("/journal").with(As.person(Role.AUDITOR)).locale(Locale.ENGLISH))
                .hasStatusOk()
                .bodyText()
                .contains("batch:" + (before + 101) + "<", "batch:" + (before + 52) + "<")
                .doesNotContain("batch:" + (before + 51) + "<", "Newest entries")
                .contains("href=\"/journal?before=" + (before + 52) + "\"");
    }

    @Test
    void showsOlderOnesAndTheWayBack() {
        assertThat(pages.get()
                        .uri("/journal?before=" + (before + 52))
                        .with(As.person(Role.AUDITOR))
                        .locale(Locale.ENGLISH))
                .bodyText()
                .contains("batch:" + (before + 51) + "<", "batch:" + (before + 2) + "<", "Newest entries")
                .doesNotContain("batch:" + (before + 52) + "<");
    }

    @Test
    void saysThatTheChainIsWhole() {
        assertThat(pages.get()
                        .uri("/journal/verification")
                        .with(As.person(Role.AUDITOR))
                        .locale(Locale.ENGLISH))
                .bodyText()
                .contains("Yes. Every hash of", journal.verify(SiteId.MAIN).headHash());
    }

    @Test
    void saysItInGermanToo() {
        assertThat(pages.get()
                        .uri("/journal/verification")
                        .with(As.person(Role.AUDITOR))
                        .locale(Locale.GERMAN))
                .bodyText()
                .contains("Ja. Jeder Hash von");
    }

    @Test
    void theApiAnswersAHundredEntriesAndWhereToGoOn() {
        assertThat(pages.get().uri("/api/v1/journal?after=" + before).with(As.program(Scope.READ)))
                .hasStatusOk()
                .bodyJson()
                .satisfies(json -> {
                    json.assertThat().extractingPath("$.items.length()").isEqualTo(100);
                    json.assertThat().extractingPath("$.items[0].subject").isEqualTo("batch:" + (before + 1));
                    json.assertThat().extractingPath("$.next").isEqualTo((int) before + 100);
                });
    }

    @Test
    void theApiSaysWhenThereIsNoMore() {
        assertThat(pages.get().uri("/api/v1/journal?after=" + (before + 100)).with(As.program(Scope.READ)))
                .bodyJson()
                .satisfies(json -> {
                    json.assertThat().extractingPath("$.items.length()").isEqualTo(1);
                    json.assertThat().extractingPath("$.next").isNull();
                });
    }

    @Test
    void theApiVerifiesTheChain() {
        JournalVerification verification = journal.verify(SiteId.MAIN);
        assertThat(pages.get().uri("/api/v1/journal/verification").with(As.program(Scope.READ)))
                .bodyJson()
                .isStrictlyEqualTo("{\"intact\":true,\"entries\":%d,\"firstBroken\":null,\"headHash\":\"%s\"}"
                        .formatted(verification.entries(), verification.headHash()));
    }

    @Test
    void overHttpsEveryAnswerAsksToStayThere() {
        assertThat(pages.get().uri("/journal").secure(true).with(As.person(Role.AUDITOR)))
                .headers()
                .hasValue("Strict-Transport-Security", "max-age=31536000");
    }
}
