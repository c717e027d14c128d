package org.levelgaze.access;

import java.time.Clock;
import java.time.OffsetDateTime;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import org.levelgaze.journal.Act;
import org.levelgaze.journal.Actor;
import org.levelgaze.journal.Journal;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.springframework.dao.DuplicateKeyException;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** The accounts of people. At least one active administrator always remains at a site. */
@Service
public class Accounts {

    private final JdbcClient jdbc;
    private final Journal journal;
    private final Passwords passwords;
    private final Clock clock;

    Accounts(JdbcClient jdbc, Journal journal, Passwords passwords, Clock clock) {
        this.jdbc = jdbc;
        this.journal = journal;
        this.passwords = passwords;
        this.clock = clock;
    }

    /** Whether there is any account at all. */
    @Transactional(readOnly = true)
    public boolean exist() {
        return jdbc.sql("select exists (select 1 from account)")
                .query(Boolean.class)
                .single();
    }

    /** All accounts of a site, in the order of their login names. */
    @Transactional(readOnly = true)
    public List<Account> all(SiteId site) {
        return jdbc.sql(AccountRow.SELECT + "where site_id = ? order by login_key")
                .param(site.value())
                .query(AccountRow::readAccount)
                .list();
    }

    /** The account with this number, if there is one. */
    @Transactional(readOnly = true)
    public Optional<Account> find(SiteId site, long id) {
        return jdbc.sql(AccountRow.SELECT + "where site_id = ? and account_id = ?")
                .params(site.value(), id)
                .query(AccountRow::readAccount)
                .optional();
    }

    /**
     * Makes an account.
     *
     * @throws Refusal {@code login-name-taken}, {@code password-too-short} or {@code password-too-long}
     */
    @Transactional
    public Account create(Actor actor, NewAccount wanted) {
        Account made = insert(actor.site(), wanted);
        journal.record(actor, Act.of("account.created", made.subject(), codes(made.roles())));
        return made;
    }

    Account insert(SiteId site, NewAccount wanted) {
        try {
            return jdbc.sql("""
                    insert into account (site_id, login_name, login_key, display_name, password_hash, roles, language, created_at)
                    values (:site, :login, :key, :name, :hash, string_to_array(:roles, ','), :language, :now)
                    returning""" + AccountRow.COLUMNS)
                    .param("site", site.value())
                    .param("login", wanted.loginName())
                    .param("key", NewAccount.key(wanted.loginName()))
                    .param("name", wanted.displayName())
                    .param("hash", passwords.hash(wanted.password()))
                    .param("roles", codes(wanted.roles()))
                    .param("language", wanted.language().toLanguageTag())
                    .param("now", OffsetDateTime.now(clock))
                    .query(AccountRow::readAccount)
                    .single();
        } catch (DuplicateKeyException taken) {
            throw new Refusal(Refusal.Kind.CONFLICT, "login-name-taken", wanted.loginName());
        }
    }

    /**
     * Gives an account other roles, at once also for whoever is signed in with it.
     *
     * @throws Refusal {@code unknown-account}, {@code no-role} or {@code last-administrator}
     */
    @Transactional
    public void changeRoles(Actor actor, long id, Set<Role> roles) {
        if (roles.isEmpty()) {
            throw new Refusal(Refusal.Kind.INVALID, "no-role");
        }
        Account account = locked(actor.site(), id);
        if (!roles.contains(Role.ADMINISTRATOR)) {
            refuseForTheLastAdministrator(account);
        }
        jdbc.sql("update account set roles = string_to_array(?, ',') where site_id = ? and account_id = ?")
                .params(codes(roles), actor.site().value(), id)
                .update();
        journal.record(actor, Act.of("account.roles-changed", account.subject(), codes(roles)));
    }

    /**
     * Ends an account or opens it again. Whoever is signed in with an ended account is signed out.
     *
     * @throws Refusal {@code unknown-account} or {@code last-administrator}
     */
    @Transactional
    public void setActive(Actor actor, long id, boolean active) {
        Account account = locked(actor.site(), id);
        if (!active) {
            refuseForTheLastAdministrator(account);
        }
        jdbc.sql("update account set active = ? where site_id = ? and account_id = ?")
                .params(active, actor.site().value(), id)
                .update();
        journal.record(actor, Act.of(active ? "account.reactivated" : "account.deactivated", account.subject(), ""));
    }

    /**
     * Gives an account a new password. Sessions opened with the one before are over.
     *
     * @throws Refusal {@code unknown-account}, {@code password-too-short} or {@code password-too-long}
     */
    @Transactional
    public void changePassword(Actor actor, long id, String password) {
        Account account = locked(actor.site(), id);
        jdbc.sql("""
                update account set password_hash = ?, credentials = credentials + 1
                where site_id = ? and account_id = ?""").params(passwords.hash(password), actor.site().value(), id).update();
        journal.record(actor, Act.of("password.changed", account.subject(), ""));
    }

    /**
     * Changes the language of an account's pages.
     *
     * @throws Refusal {@code unknown-account}
     */
    @Transactional
    public void changeLanguage(Actor actor, long id, Locale language) {
        Account account = locked(actor.site(), id);
        jdbc.sql("update account set language = ? where site_id = ? and account_id = ?")
                .params(language.toLanguageTag(), actor.site().value(), id)
                .update();
        journal.record(actor, Act.of("account.language-changed", account.subject(), language.toLanguageTag()));
    }

    /** Locks all accounts of the site in one order, so that two administrators cannot remove each other at once. */
    private Account locked(SiteId site, long id) {
        return jdbc
                .sql(AccountRow.SELECT + "where site_id = ? order by account_id for update")
                .param(site.value())
                .query(AccountRow::readAccount)
                .list()
                .stream()
                .filter(account -> account.id() == id)
                .findFirst()
                .orElseThrow(() -> new Refusal(Refusal.Kind.NOT_FOUND, "unknown-account", Long.toString(id)));
    }

    private void refuseForTheLastAdministrator(Account leaving) {
        boolean another = all(leaving.site()).stream()
                .anyMatch(other -> other.id() != leaving.id()
                        && other.active()
                        && other.roles().contains(Role.ADMINISTRATOR));
        if (!another && leaving.active() && leaving.roles().contains(Role.ADMINISTRATOR)) {
            throw new Refusal(Refusal.Kind.CONFLICT, "last-administrator", leaving.displayName());
        }
    }

    private static String codes(Set<Role> roles) {
        return roles.stream().sorted().map(Role::code).collect(Collectors.joining(","));
    }
}
