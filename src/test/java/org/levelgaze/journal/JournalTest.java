package org.levelgaze.journal;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatExceptionOfType;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.levelgaze.shared.SiteId;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.core.env.Environment;
import org.springframework.dao.DataAccessException;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.jdbc.datasource.DriverManagerDataSource;
import org.springframework.transaction.IllegalTransactionStateException;
import org.springframework.transaction.support.TransactionTemplate;

@SpringBootTest
@WithDatabase
class JournalTest {

    private static final AtomicInteger SITES = new AtomicInteger(100);

    @Autowired
    Journal journal;

    @Autowired
    TransactionTemplate transaction;

    @Autowired
    JdbcTemplate application;

    @Autowired
    Environment environment;

    private JdbcTemplate owner = new JdbcTemplate();
    private SiteId site = SiteId.MAIN;

    @BeforeEach
    void aSiteOfItsOwn() {
        owner = new JdbcTemplate(new DriverManagerDataSource(
                environment.getRequiredProperty("spring.flyway.url"),
                environment.getRequiredProperty("spring.flyway.user"),
                environment.getRequiredProperty("spring.flyway.password")));
        site = new SiteId(SITES.incrementAndGet());
        owner.update(
                "insert into site (site_id, code, name) values (?, ?, 'Kiln hall')", site.value(), "J" + site.value());
    }

    @Test
    void anEmptyJournalIsIntactAndItsHeadIsZero() {
        assertThat(journal.verify(site)).isEqualTo(new JournalVerification(true, 0, null, "0".repeat(64)));
    }

    @Test
    void entriesAreNumberedFromOneAndEachCarriesTheHashBeforeIt() {
        record("glaze.mixed", "batch:1");
        record("glaze.mixed", "batch:2");

        List<JournalEntry> entries = journal.after(site, 0, 10);

        assertThat(entries).extracting(JournalEntry::seq).containsExactly(1L, 2L);
        assertThat(entries.get(0).previousHash()).isEqualTo("0".repeat(64));
        assertThat(entries.get(1).previousHash()).isEqualTo(entries.get(0).hash());
        assertThat(journal.verify(site))
                .isEqualTo(new JournalVerification(true, 2, null, entries.get(1).hash()));
    }

    @Test
    void pagesRunForwardsAndBackwards() {
        for (int i = 1; i <= 5; i++) {
            record("glaze.mixed", "batch:" + i);
        }

        assertThat(journal.after(site, 2, 2)).extracting(JournalEntry::seq).containsExactly(3L, 4L);
        assertThat(journal.before(site, 5, 2)).extracting(JournalEntry::seq).containsExactly(4L, 3L);
    }

    @Test
    void theDatabaseAndJavaHashTheSameWhateverLettersStandInAnEntry() {
        record("glaze.mixed", "batch:Ünnütze Größe, 釉薬 🏺 12:3,4");

        assertThat(journal.verify(site).intact()).isTrue();
    }

    @Test
    void refusesAnEntryOutsideATransaction() {
        assertThatExceptionOfType(IllegalTransactionStateException.class)
                .isThrownBy(() -> journal.record(actor(), Act.of("glaze.mixed", "batch:1", "")));
    }

    @Test
    void aRollbackLeavesNothing() {
        record("glaze.mixed", "batch:1");
        transaction.executeWithoutResult(status -> {
            journal.record(actor(), Act.of("glaze.mixed", "batch:2", ""));
            status.setRollbackOnly();
        });
        record("glaze.mixed", "batch:3");

        assertThat(journal.after(site, 0, 10)).extracting(JournalEntry::subject).containsExactly("batch:1", "batch:3");
        assertThat(journal.verify(site).intact()).isTrue();
    }

    @Test
    void concurrentWritersMakeOneChain() throws Exception {
        ExecutorService writers = Executors.newFixedThreadPool(8);
        List<Future<?>> done = new ArrayList<>();
        for (int i = 0; i < 200; i++) {
            String subject = "batch:" + i;
            done.add(writers.submit(() -> transaction.executeWithoutResult(status -> {
                journal.record(actor(), Act.of("glaze.mixed", subject, ""));
                journal.record(actor(), Act.of("glaze.tested", subject, ""));
            })));
        }
        for (Future<?> each : done) {
            each.get();
        }
        writers.shutdown();

        JournalVerification verification = journal.verify(site);
        assertThat(verification.intact()).isTrue();
        assertThat(verification.entries()).isEqualTo(400);
    }

    @Test
    void namesAnEntryThatTheOwnerChanged() {
        threeEntries();
        asOwnerWithoutTriggers(
                "update journal_entry set subject = 'batch:9' where seq = 2 and site_id = " + site.value());

        assertThat(journal.verify(site).firstBroken()).isEqualTo(2);
    }

    @Test
    void namesAnEntryWhoseTimeTheOwnerMovedByOneMicrosecond() {
        threeEntries();
        asOwnerWithoutTriggers(
                "update journal_entry set at = at + interval '1 microsecond' where seq = 3 and site_id = "
                        + site.value());

        assertThat(journal.verify(site).firstBroken()).isEqualTo(3);
    }

    @Test
    void namesAnEntryThatTheOwnerRemoved() {
        threeEntries();
        asOwnerWithoutTriggers("delete from journal_entry where seq = 2 and site_id = " + site.value());

        JournalVerification verification = journal.verify(site);
        assertThat(verification.intact()).isFalse();
        assertThat(verification.firstBroken()).isEqualTo(2);
        assertThat(verification.entries()).isEqualTo(2);
    }

    @Test
    void namesTheEntryAfterOneThatWasForgedWithAFittingHash() {
        threeEntries();
        asOwnerWithoutTriggers("""
                update journal_entry set subject = 'batch:8', hash = sha256(previous_hash || convert_to(
                    journal_part(site_id::text) || journal_part(seq::text)
                    || journal_part(to_char(at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US"Z"'))
                    || journal_part(actor) || journal_part(act) || journal_part('batch:8')
                    || journal_part(encode(payload_digest, 'hex')), 'UTF8'))
                where seq = 1 and site_id = %d""".formatted(site.value()));

        assertThat(journal.verify(site).firstBroken()).isEqualTo(2);
    }

    @Test
    void namesTheFirstEntryWhenItWasRemoved() {
        threeEntries();
        asOwnerWithoutTriggers("delete from journal_entry where seq = 1 and site_id = " + site.value());

        assertThat(journal.verify(site).firstBroken()).isEqualTo(1);
    }

    @Test
    void evenTheOwnerIsRefusedAChangeARemovalAndAnEmptying() {
        threeEntries();
        for (String sql : List.of(
                "update journal_entry set actor = 'account:1'",
                "delete from journal_entry",
                "delete from journal_entry where seq = -1",
                "truncate journal_entry")) {
            assertThatExceptionOfType(DataAccessException.class)
                    .as(sql)
                    .isThrownBy(() -> owner.execute(sql))
                    .havingRootCause()
                    .withMessageContaining("The journal is only added to");
        }
    }

    @Test
    void theApplicationHasNoRightToChangeAnythingOrToSupplyItsOwnHash() {
        for (String sql : List.of(
                "update journal_entry set actor = 'account:1'",
                "delete from journal_entry",
                "truncate journal_entry",
                "alter table journal_entry disable trigger all",
                "drop trigger journal_chain on journal_entry",
                "create or replace function journal_refuse() returns trigger language plpgsql as 'begin return null; end'",
                "insert into journal_entry (site_id, seq, at, actor, act, subject, payload_digest, previous_hash, hash)"
                        + " select site_id, seq + 100, at, actor, act, subject, payload_digest, previous_hash, hash"
                        + " from journal_entry limit 1")) {
            assertThatExceptionOfType(DataAccessException.class)
                    .as(sql)
                    .isThrownBy(() -> application.execute(sql))
                    .havingRootCause()
                    .withMessageMatching("(?s).*(permission denied|must be owner|no schema).*");
        }
    }

    @Test
    void numberTimeAndHashesOfTheOwnersOwnInsertAreOverwritten() {
        threeEntries();
        owner.update(
                "insert into journal_entry (site_id, seq, at, actor, act, subject, payload_digest, previous_hash, hash)"
                        + " values (?, 77, '1999-01-01', 'system', 'glaze.mixed', 'batch:4', sha256('x'), sha256('y'), sha256('z'))",
                site.value());

        assertThat(journal.verify(site).intact()).isTrue();
        assertThat(journal.after(site, 3, 10)).extracting(JournalEntry::seq).containsExactly(4L);
    }

    @Test
    void aTemporaryTableOfTheSameNameDoesNotLeadTheChainAstray() {
        threeEntries();
        transaction.executeWithoutResult(status -> {
            application.execute("create temporary table journal_entry (like public.journal_entry) on commit drop");
            application.update(
                    "insert into public.journal_entry (site_id, actor, act, subject, payload_digest)"
                            + " values (?, 'system', 'glaze.mixed', 'batch:4', sha256('x'))",
                    site.value());
        });

        assertThat(journal.verify(site)).extracting("intact", "entries").containsExactly(true, 4L);
    }

    private Actor actor() {
        return Actor.system(site);
    }

    private void threeEntries() {
        record("glaze.mixed", "batch:1");
        record("glaze.mixed", "batch:2");
        record("glaze.mixed", "batch:3");
    }

    private void record(String kind, String subject) {
        transaction.executeWithoutResult(status -> journal.record(actor(), Act.of(kind, subject, "")));
    }

    private void asOwnerWithoutTriggers(String sql) {
        owner.execute("alter table journal_entry disable trigger user");
        owner.execute(sql);
        for (String trigger : List.of("journal_chain", "journal_refuse_change", "journal_refuse_truncate")) {
            owner.execute("alter table journal_entry enable always trigger " + trigger);
        }
    }
}
