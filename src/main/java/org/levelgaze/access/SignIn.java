package org.levelgaze.access;

import java.time.Duration;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicLong;
import org.levelgaze.shared.Refusal;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;

/** Finds out who signs in. An unknown name, an ended account and a wrong password get one answer, after the same work. */
@Component
class SignIn {

    /** Longer ones are no login names; cutting them keeps the work small. */
    private static final int MAX_TYPED = 400;

    private static final Logger LOG = LoggerFactory.getLogger(SignIn.class);

    private final JdbcClient jdbc;
    private final Passwords passwords;
    private final SignInThrottle throttle;
    private final AtomicLong succeeded = new AtomicLong();
    private final AtomicLong failed = new AtomicLong();

    SignIn(JdbcClient jdbc, Passwords passwords, SignInThrottle throttle) {
        this.jdbc = jdbc;
        this.passwords = passwords;
        this.throttle = throttle;
    }

    /**
     * The account of this name and password.
     *
     * @param address where the request comes from
     * @throws Refusal {@code sign-in-wait} with the seconds to wait, or {@code sign-in}
     */
    Account check(String loginName, String password, String address) {
        return check(loginName, password, address, "sign-in");
    }

    /**
     * Makes sure that whoever is signed in still knows the password; counted like a sign-in.
     *
     * @throws Refusal {@code sign-in-wait} with the seconds to wait, or {@code present-password}
     */
    void confirm(Account account, String password, String address) {
        check(account.loginName(), password, address, "present-password");
    }

    private Account check(String loginName, String password, String address, String refusal) {
        String name = loginName.length() > MAX_TYPED ? loginName.substring(0, MAX_TYPED) : loginName;
        Duration wait = throttle.ask(name, address);
        if (!wait.isZero()) {
            log(failed);
            throw new Refusal(Refusal.Kind.TOO_MANY, "sign-in-wait", wait.toSeconds());
        }
        AccountRow row = byName(name).filter(found -> found.account().active()).orElse(null);
        if (!passwords.matches(password, row == null ? null : row.hash()) || row == null) {
            log(failed);
            throw new Refusal(Refusal.Kind.FORBIDDEN, refusal);
        }
        throttle.succeeded(name, address);
        log(succeeded);
        return row.account();
    }

    private Optional<AccountRow> byName(String loginName) {
        return jdbc.sql(AccountRow.SELECT + "where login_key = ?")
                .param(NewAccount.key(loginName))
                .query(AccountRow::read)
                .optional();
    }

    /** Counts, but names nobody. */
    private void log(AtomicLong counter) {
        counter.incrementAndGet();
        LOG.info("Sign-ins since the start: {} succeeded, {} failed", succeeded, failed);
    }
}
