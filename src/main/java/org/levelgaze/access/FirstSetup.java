package org.levelgaze.access;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.SecureRandom;
import java.util.EnumSet;
import java.util.Locale;
import java.util.Set;
import java.util.stream.Collectors;
import org.levelgaze.journal.Act;
import org.levelgaze.journal.Journal;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.springframework.beans.factory.SmartInitializingSingleton;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import org.springframework.transaction.annotation.Transactional;

/**
 * The very first account. While there is none, the start prints a one-time code on the console, and only there: whoever can
 * read it may make that account. It holds the roles with which a small plant can work at once.
 */
@Component
class FirstSetup implements SmartInitializingSingleton {

    static final Set<Role> FIRST_ROLES =
            Set.copyOf(EnumSet.of(Role.ADMINISTRATOR, Role.QUALITY_ENGINEER, Role.HOLDER_OF_THE_STANDARD));

    private static final String LETTERS = "ABCDEFGHJKLMNPQRSTUVWXYZ23456789";
    private static final int GROUPS = 4;

    private final Accounts accounts;
    private final Journal journal;
    private final JdbcClient jdbc;
    private final String code = newCode(new SecureRandom());
    private volatile boolean done;

    FirstSetup(Accounts accounts, Journal journal, JdbcClient jdbc) {
        this.accounts = accounts;
        this.journal = journal;
        this.jdbc = jdbc;
    }

    @Override
    public void afterSingletonsInstantiated() {
        if (!isDone()) {
            System.out.printf("%n  No account yet. Open /setup and enter this one-time code: %s%n%n", code);
        }
    }

    /** Whether there is an account. Accounts are never removed, so that once done it stays done. */
    boolean isDone() {
        done = done || accounts.exist();
        return done;
    }

    /** The code of this run of the program. */
    String code() {
        return code;
    }

    /**
     * Makes the first account.
     *
     * @throws Refusal {@code setup-done} when there is one, {@code setup-code} when the code is another, or what
     *     {@link Accounts#create} refuses
     */
    @Transactional
    public Account complete(String typedCode, NewAccount first) {
        Locks.takeUntilCommit(jdbc, Locks.FIRST_ACCOUNT);
        if (accounts.exist()) {
            throw new Refusal(Refusal.Kind.NOT_FOUND, "setup-done");
        }
        if (!isCode(typedCode)) {
            throw new Refusal(Refusal.Kind.FORBIDDEN, "setup-code");
        }
        Account made = accounts.insert(SiteId.MAIN, first);
        journal.record(made.actor(), Act.of("account.created", made.subject(), ""));
        journal.record(made.actor(), Act.of("setup.completed", "site:" + SiteId.MAIN.value(), ""));
        return made;
    }

    private boolean isCode(String typed) {
        return MessageDigest.isEqual(plain(typed), plain(code));
    }

    /** Case, spaces and hyphens do not count. */
    private static byte[] plain(String typed) {
        return typed.toUpperCase(Locale.ROOT).replaceAll("[\\s-]", "").getBytes(StandardCharsets.UTF_8);
    }

    private static String newCode(SecureRandom chance) {
        return chance.ints(GROUPS, 0, 1 << 20).mapToObj(FirstSetup::group).collect(Collectors.joining("-"));
    }

    private static String group(int bits) {
        StringBuilder letters = new StringBuilder();
        for (int shift = 0; shift < 20; shift += 5) {
            letters.append(LETTERS.charAt((bits >> shift) & 31));
        }
        return letters.toString();
    }
}
