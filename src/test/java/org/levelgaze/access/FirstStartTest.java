package org.levelgaze.access;

import static org.assertj.core.api.Assertions.assertThat;

import java.net.http.HttpResponse;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.MethodOrderer;
import org.junit.jupiter.api.Order;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestMethodOrder;
import org.levelgaze.journal.Actor;
import org.levelgaze.journal.Journal;
import org.levelgaze.journal.JournalEntry;
import org.levelgaze.shared.SiteId;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.boot.test.web.server.LocalServerPort;

/** From a fresh installation to the first administrator and on, over real HTTP; the order is the story's. */
@SpringBootTest(
        webEnvironment = SpringBootTest.WebEnvironment.RANDOM_PORT,
        properties = "levelgaze.bootstrap-token=" + FirstStartTest.SECRET)
@WithDatabase
@TestMethodOrder(MethodOrderer.OrderAnnotation.class)
class FirstStartTest {

    static final String SECRET = "a-token-of-tarnhollow-stoneware-0001";

    private static final String PASSWORD = "glaze over slip over clay";
    private static final int BEFORE = 1;
    private static final int SETTING_UP = 2;
    private static final int AFTER = 3;

    @LocalServerPort
    int port;

    @Autowired
    FirstSetup setup;

    @Autowired
    Accounts accounts;

    @Autowired
    Journal journal;

    private Visitor visitor = new Visitor(0);

    @BeforeEach
    void somebodyNew() {
        visitor = new Visitor(port);
    }

    @Test
    @Order(BEFORE)
    void healthAnswersBeforeThereIsAnyAccount() {
        HttpResponse<String> health = visitor.open("/actuator/health");
        assertThat(health.statusCode()).isEqualTo(200);
        assertThat(health.body()).contains("UP").doesNotContain("postgres", "diskSpace");
    }

    @Test
    @Order(BEFORE)
    void everyPageLeadsToTheSetUpBeforeThereIsAnyAccount() {
        for (String path : List.of("/", "/studies", "/sign-in", "/settings/accounts", "/no-such-page")) {
            HttpResponse<String> page = visitor.open(path);
            assertThat(page.statusCode()).as(path).isEqualTo(302);
            assertThat(location(page)).as(path).endsWith("/setup");
        }
    }

    @Test
    @Order(BEFORE)
    void theBootstrapTokenOpensTheApiBeforeThereIsAnyAccount() {
        HttpResponse<String> answer =
                visitor.open("/api/v1/journal/verification", "AUTHORIZATION", "bearer " + SECRET, "x-SITE", "MAIN");
        assertThat(answer.statusCode()).isEqualTo(200);
        assertThat(answer.body()).contains("\"intact\":true");
        assertThat(visitor.session()).isEmpty();
    }

    @Test
    @Order(BEFORE)
    void withoutAGoodTokenTheApiAnswersProblemDetails() {
        for (String shown : List.of("Bearer nonsense", "Basic QW5hOkFuYQ==", "Bearer ", SECRET)) {
            HttpResponse<String> answer = visitor.open("/api/v1/journal", "Authorization", shown);
            assertThat(answer.statusCode()).as(shown).isEqualTo(401);
            assertThat(header(answer, "Content-Type")).isEqualTo("application/problem+json");
            assertThat(header(answer, "WWW-Authenticate")).isEqualTo("Bearer");
            assertThat(answer.body()).contains("\"type\":\"/problems/unauthorized\"");
        }
    }

    @Test
    @Order(BEFORE)
    void aTokenInTheAddressIsNotLookedAt() {
        assertThat(visitor.open("/api/v1/journal?access_token=" + SECRET + "&token=" + SECRET)
                        .statusCode())
                .isEqualTo(401);
    }

    @Test
    @Order(BEFORE)
    void anUnknownSiteIsNotFoundAndTheAnswerSaysWhere() {
        HttpResponse<String> answer =
                visitor.open("/api/v1/journal", "Authorization", "Bearer " + SECRET, "X-Site", "KILN");
        assertThat(answer.statusCode()).isEqualTo(404);
        assertThat(answer.body()).contains("/problems/unknown-site", "KILN", "X-Site");
    }

    @Test
    @Order(BEFORE)
    void anotherCodeMakesNoAccountAndKeepsWhatWasTyped() {
        HttpResponse<String> page = complete("AAAA-BBBB-CCCC-DDDD", "ana");
        assertThat(page.statusCode()).isEqualTo(422);
        assertThat(page.body())
                .contains("This is not the one-time code", "value=\"ana\"")
                .doesNotContain(PASSWORD);
        assertThat(accounts.exist()).isFalse();
    }

    @Test
    @Order(BEFORE)
    void aFormWithoutItsSecretMakesNoAccount() {
        HttpResponse<String> page = visitor.post("/setup", "", form(setup.code(), "ana"));
        assertThat(page.statusCode()).isEqualTo(302);
        assertThat(location(page)).endsWith("/setup");
        assertThat(accounts.exist()).isFalse();
    }

    @Test
    @Order(SETTING_UP)
    void twoAtOnceMakeOneAccountWhichMayDoAllThatASmallPlantNeeds() throws Exception {
        String typed = setup.code().toLowerCase(Locale.ROOT).replace('-', ' ');
        List<Callable<Integer>> both = List.of(
                () -> new Visitor(port)
                        .fillIn("/setup", "/setup", form(typed, "Ána"))
                        .statusCode(),
                () -> new Visitor(port)
                        .fillIn("/setup", "/setup", form(typed, "Béla"))
                        .statusCode());

        assertThat(together(both)).containsExactlyInAnyOrder(302, 404);
        assertThat(accounts.all(SiteId.MAIN)).singleElement().satisfies(first -> {
            assertThat(first.roles())
                    .containsExactlyInAnyOrder(Role.ADMINISTRATOR, Role.QUALITY_ENGINEER, Role.HOLDER_OF_THE_STANDARD);
            assertThat(acts()).contains("account.created " + first.subject(), "setup.completed site:1");
        });
    }

    @Test
    @Order(AFTER)
    void theSetUpIsGoneAfterwards() {
        assertThat(visitor.open("/setup").statusCode()).isEqualTo(404);
        assertThat(location(visitor.open("/"))).endsWith("/sign-in");
    }

    @Test
    @Order(AFTER)
    void signingInLeadsToThePageThatWasWantedUnderANewSessionId() {
        String name = person(Role.AUDITOR);
        assertThat(location(visitor.open("/journal?before=7"))).endsWith("/sign-in");
        String before = visitor.session();

        HttpResponse<String> signedIn = visitor.signIn(name, PASSWORD);

        assertThat(signedIn.statusCode()).isEqualTo(302);
        assertThat(location(signedIn)).endsWith("/journal?before=7");
        assertThat(before).isNotEmpty();
        assertThat(visitor.session()).isNotEmpty().isNotEqualTo(before);
        assertThat(visitor.open("/journal").body()).contains("Who did what, and when?");
        assertThat(new Visitor(port)
                        .open("/journal", "Cookie", "SESSION=" + before)
                        .statusCode())
                .as("a session id planted before the sign-in")
                .isEqualTo(302);
    }

    @Test
    @Order(AFTER)
    void theSessionsCookieIsKeptFromScriptsAndOtherSites() {
        HttpResponse<String> page = visitor.open("/sign-in");
        assertThat(page.headers().allValues("Set-Cookie"))
                .filteredOn(cookie -> cookie.startsWith("SESSION="))
                .singleElement()
                .asString()
                .contains("HttpOnly", "SameSite=Lax", "Path=/")
                .doesNotContain("Secure");
    }

    @Test
    @Order(AFTER)
    void everyPageCarriesItsHeaders() {
        HttpResponse<String> page = visitor.open("/sign-in");
        assertThat(header(page, "Content-Security-Policy"))
                .isEqualTo("default-src 'none'; script-src 'self'; style-src 'self'; img-src 'self' data:; "
                        + "font-src 'self'; connect-src 'self'; form-action 'self'; base-uri 'none'; "
                        + "frame-ancestors 'none'");
        assertThat(header(page, "X-Content-Type-Options")).isEqualTo("nosniff");
        assertThat(header(page, "Referrer-Policy")).isEqualTo("same-origin");
        assertThat(header(page, "Permissions-Policy")).contains("camera=()", "geolocation=()");
        assertThat(header(page, "Cache-Control")).contains("no-store");
        assertThat(header(page, "Strict-Transport-Security"))
                .as("only over https")
                .isEmpty();
    }

    @Test
    @Order(AFTER)
    void styleSheetsMayBeKeptByTheBrowserUnderANameOfTheirContent() {
        String page = visitor.open("/sign-in").body();
        String sheet = page.replaceAll("(?s).*href=\"(/css/levelgaze-[0-9a-f]+\\.css)\".*", "$1");
        assertThat(header(visitor.open(sheet), "Cache-Control")).contains("max-age=31536000");
    }

    @Test
    @Order(AFTER)
    void anUnknownNameAndAWrongPasswordGetTheSameAnswer() {
        String name = person(Role.APPRAISER);
        HttpResponse<String> wrong = visitor.signIn(name, "clay over slip over glaze");
        HttpResponse<String> unknown = visitor.signIn("nobody", PASSWORD);

        assertThat(wrong.statusCode()).isEqualTo(unknown.statusCode()).isEqualTo(422);
        assertThat(plain(wrong, name)).isEqualTo(plain(unknown, "nobody"));
        assertThat(wrong.body()).contains("Sign-in name and password do not fit");
    }

    @Test
    @Order(AFTER)
    void aFormThatLacksItsFieldsIsRefusedLikeAnEmptyOne() {
        assertThat(visitor.fillIn("/sign-in", "/sign-in", Map.of()).statusCode())
                .isEqualTo(422);
        assertThat(administrator()
                        .fillIn("/settings/accounts", "/settings/accounts", Map.of())
                        .statusCode())
                .isEqualTo(422);
    }

    @Test
    @Order(AFTER)
    void aPasswordOfAMegabyteIsJustWrong() {
        assertThat(visitor.signIn(person(Role.APPRAISER), "x".repeat(1_000_000)).body())
                .contains("Sign-in name and password do not fit");
    }

    @Test
    @Order(AFTER)
    void namesOfEveryScriptSignInWhateverTheirCaseAndForm() {
        for (String[] names :
                new String[][] {{"Jürgen.Größe", "JU\u0308RGEN.GRÖSSE"}, {"עֲנָת", "עֲנָת"}, {"Ołena", "oŁENA"}}) {
            accounts.create(
                    Actor.system(SiteId.MAIN),
                    new NewAccount(names[0], names[0], PASSWORD, Set.of(Role.QUALITY_ENGINEER), Locale.ENGLISH));
            Visitor someone = new Visitor(port);
            assertThat(someone.signIn(names[1], PASSWORD).statusCode())
                    .as(names[1])
                    .isEqualTo(302);
            assertThat(someone.open("/").statusCode()).isEqualTo(200);
        }
    }

    @Test
    @Order(AFTER)
    void whoeverMayNotIsToldSoAndWhoeverMistypedToo() {
        visitor.signIn(person(Role.APPRAISER), PASSWORD);
        assertThat(visitor.open("/settings").statusCode()).isEqualTo(403);
        assertThat(visitor.open("/settings").body()).contains("Your role may not open this", "Sign out");
        assertThat(visitor.open("/no-such-page").statusCode()).isEqualTo(404);
        assertThat(visitor.open("/api/v1/journal").statusCode())
                .as("the API takes tokens alone")
                .isEqualTo(401);
    }

    @Test
    @Order(AFTER)
    void aFormWithoutItsSecretChangesNothing() {
        visitor.signIn(person(Role.ADMINISTRATOR), PASSWORD);
        int before = accounts.all(SiteId.MAIN).size();
        assertThat(visitor.post("/settings/accounts", "guessed", Map.of("loginName", "planted"))
                        .statusCode())
                .isEqualTo(403);
        assertThat(accounts.all(SiteId.MAIN)).hasSize(before);
    }

    @Test
    @Order(AFTER)
    void afterSigningOutTheSessionIsWorthNothing() {
        visitor.signIn(person(Role.AUDITOR), PASSWORD);
        String session = visitor.session();
        assertThat(visitor.fillIn("/", "/sign-out", Map.of()).statusCode()).isEqualTo(302);
        assertThat(visitor.open("/sign-in?after=sign-out").body()).contains("You are signed out");
        assertThat(new Visitor(port).open("/", "Cookie", "SESSION=" + session).statusCode())
                .isEqualTo(302);
    }

    @Test
    @Order(AFTER)
    void anEndedAccountIsOutAtOnceAndOtherRolesCountAtOnce() {
        String name = person(Role.QUALITY_ENGINEER);
        Account account = byName(name);
        visitor.signIn(name, PASSWORD);
        assertThat(visitor.open("/journal").statusCode()).isEqualTo(200);

        accounts.changeRoles(Actor.system(SiteId.MAIN), account.id(), Set.of(Role.APPRAISER));
        assertThat(visitor.open("/journal").statusCode()).isEqualTo(403);

        accounts.setActive(Actor.system(SiteId.MAIN), account.id(), false);
        assertThat(visitor.open("/").statusCode()).isEqualTo(302);
        assertThat(visitor.signIn(name, PASSWORD).body()).contains("Sign-in name and password do not fit");
    }

    @Test
    @Order(AFTER)
    void aNewPasswordEndsTheOtherSessionsAndKeepsThisOne() {
        String name = person(Role.AUDITOR);
        Visitor elsewhere = new Visitor(port);
        elsewhere.signIn(name, PASSWORD);
        visitor.signIn(name, PASSWORD);
        String other = "slip over clay over glaze";

        HttpResponse<String> refused = visitor.fillIn(
                "/account",
                "/account/password",
                Map.of("present", "not this one at all", "password", other, "repeated", other));
        assertThat(refused.body()).contains("The present password is another");

        HttpResponse<String> changed = visitor.fillIn(
                "/account", "/account/password", Map.of("present", PASSWORD, "password", other, "repeated", other));
        assertThat(changed.statusCode()).isEqualTo(302);
        assertThat(visitor.open("/account").statusCode()).isEqualTo(200);
        assertThat(elsewhere.open("/account").statusCode()).isEqualTo(302);
        assertThat(new Visitor(port).signIn(name, other).statusCode()).isEqualTo(302);
    }

    @Test
    @Order(AFTER)
    void theChosenLanguageComesBackWithTheSignIn() {
        String name = person(Role.AUDITOR);
        visitor.signIn(name, PASSWORD);
        visitor.fillIn("/account", "/account/language", Map.of("language", "de"));
        Visitor elsewhere = new Visitor(port);
        elsewhere.signIn(name, PASSWORD);
        assertThat(elsewhere.open("/account").body()).contains("Welche Sprache lesen Sie?");
    }

    @Test
    @Order(AFTER)
    void guessingIsSlowedDownAndTheAnswerSaysForHowLong() {
        String name = person(Role.APPRAISER);
        for (int i = 0; i <= SignInThrottle.FREE_TRIES; i++) {
            visitor.signIn(name, "guess number " + i + " of many");
        }
        HttpResponse<String> slowed = visitor.signIn(name, PASSWORD);
        assertThat(slowed.statusCode()).isEqualTo(429);
        assertThat(slowed.body()).containsPattern("Try again in (one second|\\d seconds)");
    }

    @Test
    @Order(AFTER)
    void administratorsMakeAccountsAndTokensOnTheirPages() {
        visitor.signIn(person(Role.ADMINISTRATOR), PASSWORD);
        HttpResponse<String> made = visitor.fillIn(
                "/settings/accounts",
                "/settings/accounts",
                Map.of(
                        "displayName",
                        "Noa",
                        "loginName",
                        "noa",
                        "password",
                        PASSWORD,
                        "language",
                        "de",
                        "roles",
                        "PROCTOR"));
        assertThat(made.statusCode()).isEqualTo(302);
        assertThat(visitor.open("/settings/accounts").body()).contains("Noa may sign in now", "Proctor");

        HttpResponse<String> token =
                visitor.fillIn("/settings/tokens", "/settings/tokens", Map.of("label", "Line 4 <b>", "scopes", "READ"));
        String secret = token.body().replaceAll("(?s).*<code>(lg_[^<]+)</code>.*", "$1");
        assertThat(token.body()).contains("Line 4 &lt;b&gt;");
        assertThat(visitor.open("/settings/tokens").body()).contains("Line 4").doesNotContain(secret);

        Visitor program = new Visitor(port);
        assertThat(program.open("/api/v1/journal", "Authorization", "Bearer " + secret)
                        .statusCode())
                .isEqualTo(200);
        HttpResponse<String> measurements = program.open("/actuator/prometheus", "Authorization", "Bearer " + secret);
        assertThat(measurements.statusCode()).isEqualTo(403);
    }

    @Test
    @Order(AFTER)
    void aScopeThatIsMissingIsNamed() {
        HttpResponse<String> made = administrator()
                .fillIn("/settings/tokens", "/settings/tokens", Map.of("label", "Gate", "scopes", "INTERLOCK"));
        String secret = made.body().replaceAll("(?s).*<code>(lg_[^<]+)</code>.*", "$1");
        HttpResponse<String> answer = visitor.open("/api/v1/journal", "Authorization", "Bearer " + secret);
        assertThat(answer.statusCode()).isEqualTo(403);
        assertThat(header(answer, "Content-Type")).isEqualTo("application/problem+json");
        assertThat(answer.body()).contains("/problems/missing-scope", "the scope read");
    }

    @Test
    @Order(AFTER)
    void everyChangeIsInTheJournalWithoutANameOfAnybody() {
        assertThat(acts()).anyMatch(act -> act.startsWith("token.created token:"));
        assertThat(journal.verify(SiteId.MAIN).intact()).isTrue();
        assertThat(journal.after(SiteId.MAIN, 0, 1000))
                .extracting(JournalEntry::subject)
                .allMatch(subject -> subject.matches("(account|token|site):\\d+"));
    }

    private Visitor administrator() {
        Visitor someone = new Visitor(port);
        someone.signIn(person(Role.ADMINISTRATOR), PASSWORD);
        return someone;
    }

    private String person(Role... roles) {
        String name = "person" + accounts.all(SiteId.MAIN).size();
        accounts.create(Actor.system(SiteId.MAIN), new NewAccount(name, "P", PASSWORD, Set.of(roles), Locale.ENGLISH));
        return name;
    }

    private Account byName(String loginName) {
        return accounts.all(SiteId.MAIN).stream()
                .filter(account -> account.loginName().equals(loginName))
                .findFirst()
                .orElseThrow();
    }

    private List<String> acts() {
        return journal.after(SiteId.MAIN, 0, 1000).stream()
                .map(entry -> entry.act() + " " + entry.subject())
                .toList();
    }

    private HttpResponse<String> complete(String code, String loginName) {
        return visitor.fillIn("/setup", "/setup", form(code, loginName));
    }

    private static Map<String, String> form(String code, String loginName) {
        return Map.of(
                "code",
                code,
                "displayName",
                "Ana Tarn",
                "loginName",
                loginName,
                "password",
                PASSWORD,
                "repeated",
                PASSWORD);
    }

    private static <T> List<T> together(List<Callable<T>> all) throws Exception {
        ExecutorService threads = Executors.newFixedThreadPool(all.size());
        try {
            List<T> results = new ArrayList<>();
            for (Future<T> each : threads.invokeAll(all)) {
                results.add(each.get());
            }
            return results;
        } finally {
            threads.shutdown();
        }
    }

    private static String plain(HttpResponse<String> page, String typed) {
        return page.body()
                .replaceAll("name=\"_csrf\" value=\"[^\"]+\"", "")
                .replaceAll("hx-headers=\"[^\"]+\"", "")
                .replace("value=\"" + typed + "\"", "");
    }

    private static String location(HttpResponse<String> page) {
        return header(page, "Location");
    }

    private static String header(HttpResponse<String> page, String name) {
        return page.headers().firstValue(name).orElse("");
    }
}
