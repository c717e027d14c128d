package org.levelgaze.access;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.UUID;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.junit.jupiter.api.Test;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.jdbc.core.simple.JdbcClient;

/** The waiting times are this program's own choice; no standard names them. */
@SpringBootTest
@WithDatabase
class SignInThrottleTest {

    private static final Instant START = Instant.parse("2027-03-01T06:00:00Z");

    @Autowired
    JdbcClient jdbc;

    private final String account = "ana-" + UUID.randomUUID();
    private final String address = "192.0.2." + UUID.randomUUID();

    @Test
    void aFewSlipsAreFreeThenEachWaitIsTwiceAsLong() {
        for (int i = 0; i <= SignInThrottle.FREE_TRIES; i++) {
            assertThat(at(0).ask(account, address)).isZero();
        }
        assertThat(at(0).ask(account, address)).isEqualTo(Duration.ofSeconds(5));
        assertThat(at(4).ask(account, address)).isEqualTo(Duration.ofSeconds(1));
        assertThat(at(5).ask(account, address)).isZero();
        assertThat(at(5).ask(account, address)).isEqualTo(Duration.ofSeconds(10));
        assertThat(at(15).ask(account, address)).isZero();
        assertThat(at(15).ask(account, address)).isEqualTo(Duration.ofSeconds(20));
    }

    @Test
    void noWaitIsLongerThanAQuarterOfAnHour() {
        long now = 0;
        Duration longest = Duration.ZERO;
        for (int i = 0; i < 25; i++) {
            Duration wait = at(now).ask(account, address);
            longest = longest.compareTo(wait) < 0 ? wait : longest;
            now += wait.toSeconds();
        }
        assertThat(longest).isEqualTo(Duration.ofMinutes(15));
    }

    @Test
    void triesDuringTheWaitDoNotMakeItLonger() {
        fail(5);
        for (int i = 0; i < 50; i++) {
            at(1).ask(account, address);
        }
        assertThat(at(5).ask(account, address)).isZero();
    }

    @Test
    void theNameCountsWhateverItsCase() {
        fail(5);
        assertThat(at(0).ask(account.toUpperCase(Locale.ROOT), address)).isPositive();
    }

    @Test
    void anotherAddressAndAnotherAccountAreNotSlowed() {
        fail(5);
        assertThat(at(0).ask(account, address + "1")).isZero();
        assertThat(at(0).ask(account + "1", address)).isZero();
    }

    @Test
    void anAddressThatTriesManyNamesIsSlowed() {
        for (int i = 0; i <= SignInThrottle.FREE_TRIES_OF_AN_ADDRESS; i++) {
            assertThat(at(0).ask(account + i, address)).isZero();
        }
        assertThat(at(0).ask(account + "another", address)).isEqualTo(Duration.ofSeconds(5));
    }

    @Test
    void aSuccessForgetsTheSlipsOfThisAccount() {
        fail(4);
        at(0).succeeded(account, address);
        fail(5);
        assertThat(at(0).ask(account, address)).isEqualTo(Duration.ofSeconds(5));
    }

    @Test
    void peopleBehindOneAddressWhoSignInDoNotSlowEachOther() {
        for (int i = 0; i < 200; i++) {
            assertThat(at(0).ask(account + i, address)).isZero();
            at(0).succeeded(account + i, address);
        }
    }

    @Test
    void aDayLaterNothingIsKeptAgainstAnybody() {
        fail(5);
        assertThat(at(86_401).ask(account, address)).isZero();
        assertThat(at(86_401).ask(account, address)).isZero();
    }

    @Test
    void aHundredTriesAtOnceGetNoMoreGuessesThanOneByOne() throws Exception {
        ExecutorService threads = Executors.newFixedThreadPool(8);
        Callable<Duration> guess = () -> at(0).ask(account, address);
        int free = 0;
        for (Future<Duration> each : threads.invokeAll(Collections.nCopies(100, guess))) {
            free += each.get().isZero() ? 1 : 0;
        }
        threads.shutdown();
        assertThat(free).isEqualTo(SignInThrottle.FREE_TRIES + 1);
    }

    @Test
    void whatWasTypedIsNotKept() {
        fail(1);
        List<String> kept = jdbc.sql("select row_to_json(f)::text from sign_in_failure f")
                .query(String.class)
                .list();
        assertThat(kept).isNotEmpty().noneMatch(row -> row.contains(account) || row.contains("192.0.2."));
    }

    private void fail(int times) {
        for (int i = 0; i < times; i++) {
            at(0).ask(account, address);
        }
    }

    /** A program that was started anew for this one question. */
    private SignInThrottle at(long seconds) {
        return new SignInThrottle(jdbc, Clock.fixed(START.plusSeconds(seconds), ZoneOffset.UTC));
    }
}
