package org.levelgaze.access;

import java.time.Clock;
import java.time.Duration;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Optional;
import org.levelgaze.shared.SiteId;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import org.springframework.transaction.annotation.Transactional;

/**
 * Slows down whoever guesses passwords. Failures are counted in the database, so a restart forgets none: for each account
 * from each address, and for each address over all accounts (where many people may sit behind one). After the free tries
 * each failure makes the next try wait, twice as long each time, up to a quarter of an hour. A day without a failure
 * forgets them.
 */
@Component
class SignInThrottle {

    static final int FREE_TRIES = 4;
    static final int FREE_TRIES_OF_AN_ADDRESS = 30;
    static final Duration FIRST_WAIT = Duration.ofSeconds(5);
    static final Duration LONGEST_WAIT = Duration.ofMinutes(15);
    private static final Duration MEMORY = Duration.ofDays(1);

    private static final String COUNT = """
            insert into sign_in_failure as f (site_id, subject, failures, failed_at, wait_until)
            values (:site, :subject, 1, :now, :now)
            on conflict (site_id, subject) do update set
                failures = case when f.failed_at < :forgotten then 1 else f.failures + 1 end,
                failed_at = :now,
                wait_until = :now + case
                    when f.failed_at < :forgotten or f.failures < :free then interval '0'
                    else least(:first * power(2, least(f.failures - :free, 20)), :longest) * interval '1 second' end
            where f.wait_until <= :now""";

    private final JdbcClient jdbc;
    private final Clock clock;

    SignInThrottle(JdbcClient jdbc, Clock clock) {
        this.jdbc = jdbc;
        this.clock = clock;
    }

    /**
     * Asks for one try. It is counted as failed at once, before the password is looked at, so that many tries at the same
     * time count as many; {@link #succeeded} takes it back.
     *
     * @return how long to wait before a try; zero when this one may go on
     */
    @Transactional
    public Duration ask(String account, String address) {
        OffsetDateTime now = OffsetDateTime.now(clock);
        jdbc.sql("delete from sign_in_failure where failed_at < ?")
                .param(now.minus(MEMORY))
                .update();
        Duration wait = wait(account, address, now);
        if (!wait.isZero()) {
            return wait;
        }
        boolean free = count(ofAddress(address), FREE_TRIES_OF_AN_ADDRESS, now)
                && count(ofPair(account, address), FREE_TRIES, now);
        return free ? Duration.ZERO : wait(account, address, now);
    }

    /** Forgets the failures of this account from this address, and takes this try back from the address. */
    @Transactional
    public void succeeded(String account, String address) {
        jdbc.sql("delete from sign_in_failure where site_id = ? and subject = ?")
                .params(SiteId.MAIN.value(), ofPair(account, address))
                .update();
        jdbc.sql("""
                update sign_in_failure set failures = greatest(failures - 1, 1), wait_until = failed_at
                where site_id = ? and subject = ?""").params(SiteId.MAIN.value(), ofAddress(address)).update();
    }

    private boolean count(byte[] subject, int free, OffsetDateTime now) {
        return jdbc.sql(COUNT)
                        .param("site", SiteId.MAIN.value())
                        .param("subject", subject)
                        .param("now", now)
                        .param("forgotten", now.minus(MEMORY))
                        .param("free", free)
                        .param("first", FIRST_WAIT.toSeconds())
                        .param("longest", LONGEST_WAIT.toSeconds())
                        .update()
                == 1;
    }

    /** How long to wait from now, in whole seconds, rounded up. */
    private Duration wait(String account, String address, OffsetDateTime now) {
        return jdbc.sql("""
                select max(wait_until) from sign_in_failure
                where site_id = :site and subject in (:subjects) and wait_until > :now""")
                .param("site", SiteId.MAIN.value())
                .param("subjects", List.of(ofAddress(address), ofPair(account, address)))
                .param("now", now)
                .query((row, number) -> Optional.ofNullable(row.getObject(1, OffsetDateTime.class)))
                .single()
                .map(until -> Duration.ofSeconds(
                        Duration.between(now, until).plusMillis(999).toSeconds()))
                .orElse(Duration.ZERO);
    }

    private static byte[] ofAddress(String address) {
        return Digests.sha256("address\n" + address);
    }

    private static byte[] ofPair(String account, String address) {
        return Digests.sha256("account\n" + address + "\n" + NewAccount.key(account));
    }
}
