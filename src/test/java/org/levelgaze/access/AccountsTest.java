package org.levelgaze.access;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatExceptionOfType;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import java.util.concurrent.CyclicBarrier;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.levelgaze.journal.Actor;
import org.levelgaze.journal.Journal;
import org.levelgaze.journal.JournalEntry;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.core.env.Environment;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.jdbc.datasource.DriverManagerDataSource;

@SpringBootTest
@WithDatabase
class AccountsTest {

    private static final AtomicInteger SITES = new AtomicInteger(200);

    @Autowired
    Accounts accounts;

    @Autowired
    Journal journal;

    @Autowired
    Environment environment;

    private Actor actor = Actor.system(SiteId.MAIN);

    @BeforeEach
    void aSiteOfItsOwn() {
        SiteId site = new SiteId(SITES.incrementAndGet());
        new JdbcTemplate(new DriverManagerDataSource(
                        environment.getRequiredProperty("spring.flyway.url"),
                        environment.getRequiredProperty("spring.flyway.user"),
                        environment.getRequiredProperty("spring.flyway.password")))
                .update(
                        "insert into site (site_id, code, name) values (?, ?, 'Kiln hall')",
                        site.value(),
                        "A" + site.value());
        actor = Actor.system(site);
    }

    @Test
    void aLoginNameBelongsToOneAccountWhateverItsCase() {
        create("Ana", Role.AUDITOR);
        assertThatExceptionOfType(Refusal.class)
                .isThrownBy(() -> create("aNA", Role.AUDITOR))
                .satisfies(refusal -> {
                    assertThat(refusal.type()).isEqualTo("login-name-taken");
                    assertThat(refusal.arguments())
                            .isEqualTo(List.of("aNA" + actor.site().value()));
                });
    }

    @Test
    void everyChangeIsJournalledAndNamesNobody() {
        Account ana = create("Ana", Role.AUDITOR);
        accounts.changeRoles(actor, ana.id(), Set.of(Role.PROCTOR));
        accounts.changePassword(actor, ana.id(), "slip over clay");
        accounts.changeLanguage(actor, ana.id(), Locale.GERMAN);
        accounts.setActive(actor, ana.id(), false);
        accounts.setActive(actor, ana.id(), true);

        List<JournalEntry> entries = journal.after(actor.site(), 0, 100);
        assertThat(entries)
                .extracting(JournalEntry::act)
                .containsExactly(
                        "account.created",
                        "account.roles-changed",
                        "password.changed",
                        "account.language-changed",
                        "account.deactivated",
                        "account.reactivated");
        assertThat(entries).extracting(JournalEntry::subject).containsOnly("account:" + ana.id());
    }

    @Test
    void theLastAdministratorCanNeitherLeaveNorChangeRoles() {
        Account only = create("Ana", Role.ADMINISTRATOR);
        create("Béla", Role.AUDITOR);

        assertThatExceptionOfType(Refusal.class)
                .isThrownBy(() -> accounts.setActive(actor, only.id(), false))
                .satisfies(refusal -> assertThat(refusal.type()).isEqualTo("last-administrator"));
        assertThatExceptionOfType(Refusal.class)
                .isThrownBy(() -> accounts.changeRoles(actor, only.id(), Set.of(Role.AUDITOR)))
                .satisfies(refusal -> assertThat(refusal.type()).isEqualTo("last-administrator"));
    }

    @Test
    void anEndedAdministratorIsNoSuccessor() {
        Account first = create("Ana", Role.ADMINISTRATOR);
        Account second = create("Béla", Role.ADMINISTRATOR);
        accounts.setActive(actor, second.id(), false);

        assertThatExceptionOfType(Refusal.class).isThrownBy(() -> accounts.setActive(actor, first.id(), false));
    }

    @Test
    void twoAdministratorsWhoEndEachOtherAtOnceLeaveOne() throws Exception {
        for (int round = 0; round < 10; round++) {
            List<Account> both =
                    List.of(create("a" + round, Role.ADMINISTRATOR), create("b" + round, Role.ADMINISTRATOR));
            if (round > 0) {
                accounts.all(actor.site()).stream()
                        .filter(earlier -> earlier.active() && !both.contains(earlier))
                        .forEach(earlier -> accounts.setActive(actor, earlier.id(), false));
            }
            endAtOnce(both);

            assertThat(accounts.all(actor.site()))
                    .filteredOn(account -> account.active() && account.roles().contains(Role.ADMINISTRATOR))
                    .hasSize(1);
        }
    }

    @Test
    void anAccountOfAnotherSiteIsUnknownHere() {
        Account ana = create("Ana", Role.AUDITOR);
        assertThatExceptionOfType(Refusal.class)
                .isThrownBy(() -> accounts.changePassword(Actor.system(SiteId.MAIN), ana.id(), "slip over clay"))
                .satisfies(refusal -> assertThat(refusal.type()).isEqualTo("unknown-account"));
    }

    private void endAtOnce(List<Account> both) throws Exception {
        CyclicBarrier start = new CyclicBarrier(both.size());
        ExecutorService threads = Executors.newFixedThreadPool(both.size());
        List<Future<?>> done = new ArrayList<>();
        for (Account each : both) {
            done.add(threads.submit(() -> {
                start.await(10, TimeUnit.SECONDS);
                try {
                    accounts.setActive(actor, each.id(), false);
                } catch (Refusal refusal) {
                    assertThat(refusal.type()).isEqualTo("last-administrator");
                }
                return null;
            }));
        }
        for (Future<?> each : done) {
            each.get();
        }
        threads.shutdown();
    }

    private Account create(String name, Role... roles) {
        return accounts.create(
                actor,
                new NewAccount(name + actor.site().value(), name, "glaze over slip", Set.of(roles), Locale.ENGLISH));
    }
}
