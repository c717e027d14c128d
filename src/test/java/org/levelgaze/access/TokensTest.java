package org.levelgaze.access;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatExceptionOfType;

import java.time.LocalDate;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.jdbc.core.simple.JdbcClient;

@SpringBootTest
@WithDatabase
class TokensTest {

    private final Actor actor = Actor.system(SiteId.MAIN);

    @Autowired
    Tokens tokens;

    @Autowired
    JdbcClient jdbc;

    @Test
    void aTokenIsFoundByItsSecretAloneAndCarriesItsScopes() {
        Tokens.Made made = tokens.create(actor, " Line 4 ", Set.of(Scope.READ, Scope.KEY_READ));
        assertThat(tokens.bySecret(made.secret())).hasValueSatisfying(found -> {
            assertThat(found.label()).isEqualTo("Line 4");
            assertThat(found.scopes()).containsExactlyInAnyOrder(Scope.READ, Scope.KEY_READ);
        });
        assertThat(tokens.bySecret(made.secret() + "x")).isEmpty();
        assertThat(tokens.bySecret("")).isEmpty();
    }

    @Test
    void theSecretItselfIsNotKept() {
        Tokens.Made made = tokens.create(actor, "Line 5", Set.of(Scope.READ));
        List<String> kept = jdbc.sql("select row_to_json(t)::text from token t")
                .query(String.class)
                .list();
        assertThat(kept).isNotEmpty().noneMatch(row -> row.contains(made.secret()));
        assertThat(made.toString()).doesNotContain(made.secret());
    }

    @Test
    void aRevokedTokenHoldsNoLongerAndIsRevokedOnce() {
        Tokens.Made made = tokens.create(actor, "Line 6", Set.of(Scope.READ));
        tokens.revoke(actor, made.token().id());
        assertThat(tokens.bySecret(made.secret())).isEmpty();
        assertThatExceptionOfType(Refusal.class)
                .isThrownBy(() -> tokens.revoke(actor, made.token().id()))
                .satisfies(refusal -> assertThat(refusal.type()).isEqualTo("unknown-token"));
    }

    @Test
    void theDayOfTheLastUseIsNoted() {
        Tokens.Made made = tokens.create(actor, "Line 7", Set.of(Scope.READ));
        assertThat(made.token().lastUsedOn()).isNull();
        tokens.bySecret(made.secret());
        Optional<LocalDate> noted = tokens.all(SiteId.MAIN).stream()
                .filter(token -> token.id() == made.token().id())
                .findFirst()
                .map(token -> Objects.requireNonNull(token.lastUsedOn()));
        assertThat(noted).isPresent();
    }

    @Test
    void refusesATokenThatMayNothingOrIsForNothing() {
        assertThatExceptionOfType(Refusal.class)
                .isThrownBy(() -> tokens.create(actor, "Line 8", Set.of()))
                .satisfies(refusal -> assertThat(refusal.type()).isEqualTo("no-scope"));
        assertThatExceptionOfType(Refusal.class)
                .isThrownBy(() -> tokens.create(actor, "  ", Set.of(Scope.READ)))
                .satisfies(refusal -> assertThat(refusal.type()).isEqualTo("token-label"));
    }

    @Test
    void theBootstrapTokenIsNotMadeWhenThereWasEverAToken() {
        Tokens.Made made = tokens.create(actor, "Line 9", Set.of(Scope.READ));
        tokens.revoke(actor, made.token().id());
        assertThat(tokens.createFirst("another secret")).isEmpty();
        assertThat(tokens.bySecret("another secret")).isEmpty();
    }
}
