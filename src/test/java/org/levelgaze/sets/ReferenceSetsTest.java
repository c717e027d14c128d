package org.levelgaze.sets;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.LocalDate;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.DefectKind;
import org.levelgaze.register.Severity;
import org.levelgaze.register.Task;
import org.levelgaze.register.Tasks;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.levelgaze.shared.Sites;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.dao.DataAccessException;
import org.springframework.jdbc.core.simple.JdbcClient;

@SpringBootTest
@WithDatabase
class ReferenceSetsTest {

    private static final Actor HOLDER = new Actor(SiteId.MAIN, "account:41");
    private static final NewPiece GOOD = new NewPiece("G-1", TrueState.GOOD, null, Zone.CLEAR_GOOD);
    private static final NewPiece CRACKED = new NewPiece("D-1", TrueState.DEFECTIVE, "CRACK", Zone.CLEAR_DEFECTIVE);
    private static final NewPiece UNDECIDED = new NewPiece("U-1", TrueState.GREY, null, Zone.BORDERLINE);

    @Autowired
    ReferenceSets sets;

    @Autowired
    Tasks tasks;

    @Autowired
    Sites sites;

    @Autowired
    JdbcClient jdbc;

    private Task task;

    @BeforeEach
    void aTask() {
        task = tasks.byCode(SiteId.MAIN, "SETS-RIM")
                .orElseGet(() -> tasks.create(
                        HOLDER, "SETS-RIM", "Rim", List.of(new DefectKind("CRACK", "Crack", Severity.CRITICAL))));
    }

    @Test
    void freezesPiecesAndTrueStatesInAFirstEdition() {
        ReferenceSet set = sets.create(HOLDER, task, newSet("S-1", GOOD, CRACKED, UNDECIDED));

        Edition edition = sets.newest(set);
        assertThat(edition.number()).isEqualTo(1);
        assertThat(edition.pieces()).isEqualTo(3);
        assertThat(edition.defective()).isEqualTo(1);
        assertThat(edition.grey()).isEqualTo(1);
        assertThat(edition.good()).isEqualTo(1);
        assertThat(sets.piecesForScoring(set, 1))
                .extracting(EditionPiece::label)
                .containsExactly("G-1", "D-1", "U-1");
    }

    /** standing.md: default 12 months after the decision, the last day included. */
    @Test
    void isInDateForTwelveMonthsWhenNobodySaysOtherwise() {
        LocalDate decided = LocalDate.of(2024, 2, 29);
        ReferenceSet set = sets.create(
                HOLDER, task, new NewSet("S-2", decided, "A. Holm", null, Basis.DECISION, List.of(GOOD, CRACKED)));

        Edition edition = sets.newest(set);
        assertThat(edition.validUntil()).isEqualTo(LocalDate.of(2025, 2, 28));
        assertThat(edition.inDateOn(decided.minusDays(1))).isFalse();
        assertThat(edition.inDateOn(decided)).isTrue();
        assertThat(edition.inDateOn(edition.validUntil())).isTrue();
        assertThat(edition.inDateOn(edition.validUntil().plusDays(1))).isFalse();
    }

    @Test
    void recordsOncePerPersonThatTheAnswerKeyWasRead() {
        ReferenceSet set = sets.create(HOLDER, task, newSet("S-3", GOOD, CRACKED));

        sets.readKey(HOLDER, set, 1, "first page");
        sets.readKey(HOLDER, set, 1, "second page");

        assertThat(sets.keyReadings(set, 1)).singleElement().satisfies(reading -> {
            assertThat(reading.who()).isEqualTo("account:41");
            assertThat(reading.page()).isEqualTo("first page");
        });
    }

    @Test
    void refusesADecisionThatLiesAhead() {
        LocalDate tomorrow = sites.today(SiteId.MAIN).plusDays(1);

        assertRefused(
                "decision-lies-ahead",
                () -> sets.create(
                        HOLDER, task, new NewSet("S-4", tomorrow, "", null, Basis.DECISION, List.of(GOOD, CRACKED))));
    }

    @Test
    void refusesWhatCannotBeASet() {
        assertRefused("set-without-pieces", () -> newSet("S-5"));
        assertRefused("piece-twice", () -> newSet("S-5", GOOD, GOOD));
        assertRefused("good-piece-with-defect", () -> new NewPiece("G-2", TrueState.GOOD, "CRACK", null));
        assertRefused(
                "unknown-defect-kind",
                () -> sets.create(HOLDER, task, newSet("S-5", new NewPiece("D-2", TrueState.DEFECTIVE, "DENT", null))));
        assertThat(sets.byCode(SiteId.MAIN, "S-5")).isEmpty();
    }

    @Test
    void refusesACodeThatIsTaken() {
        sets.create(HOLDER, task, newSet("S-6", GOOD, CRACKED));

        assertRefused("set-exists", () -> sets.create(HOLDER, task, newSet("S-6", GOOD, CRACKED)));
    }

    @Test
    void neverLetsTheProgramChangeATrueState() {
        sets.create(HOLDER, task, newSet("S-7", GOOD, CRACKED));

        assertThatThrownBy(() ->
                        jdbc.sql("update edition_piece set true_state = 'good'").update())
                .isInstanceOf(DataAccessException.class)
                .rootCause()
                .hasMessageContaining("permission denied");
    }

    private static NewSet newSet(String code, NewPiece... pieces) {
        return new NewSet(code, LocalDate.of(2026, 1, 15), "A. Holm", null, Basis.DECISION, List.of(pieces));
    }

    private static void assertRefused(String type, org.assertj.core.api.ThrowableAssert.ThrowingCallable act) {
        assertThatThrownBy(act)
                .isInstanceOfSatisfying(
                        Refusal.class, refusal -> assertThat(refusal.type()).isEqualTo(type));
    }
}
