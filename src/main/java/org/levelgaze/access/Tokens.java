package org.levelgaze.access;

import java.security.SecureRandom;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Clock;
import java.time.LocalDate;
import java.time.OffsetDateTime;
import java.util.Arrays;
import java.util.Base64;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import org.levelgaze.journal.Act;
import org.levelgaze.journal.Actor;
import org.levelgaze.journal.Journal;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;

/** The tokens of programs. Only digests are stored; a token's secret is answered once, by {@link #create}. */
@Service
public class Tokens {

    private static final String COLUMNS = " site_id, token_id, label, scopes, created_at, last_used_on, revoked_at ";
    private static final int MAX_LABEL = 100;

    private final JdbcClient jdbc;
    private final Journal journal;
    private final Clock clock;
    private final SecureRandom chance = new SecureRandom();

    Tokens(JdbcClient jdbc, Journal journal, Clock clock) {
        this.jdbc = jdbc;
        this.journal = journal;
        this.clock = clock;
    }

    /**
     * A token that was just made.
     *
     * @param token what is kept
     * @param secret what the program has to show; it is kept nowhere
     */
    public record Made(Token token, String secret) {

        /** Never shows the secret. */
        @Override
        public String toString() {
            return token.subject();
        }
    }

    /** All tokens of a site with the newest first. */
    @Transactional(readOnly = true)
    public List<Token> all(SiteId site) {
        return jdbc.sql("select" + COLUMNS + "from token where site_id = ? order by token_id desc")
                .param(site.value())
                .query(Tokens::read)
                .list();
    }

    /**
     * Makes a token.
     *
     * @param label what it is called, 1 to 100 characters
     * @param scopes what it may do, one or more
     * @throws Refusal {@code token-label} or {@code no-scope}
     */
    @Transactional
    public Made create(Actor actor, String label, Set<Scope> scopes) {
        if (label.isBlank() || label.strip().length() > MAX_LABEL) {
            throw new Refusal(Refusal.Kind.INVALID, "token-label", MAX_LABEL);
        }
        if (scopes.isEmpty()) {
            throw new Refusal(Refusal.Kind.INVALID, "no-scope");
        }
        byte[] random = new byte[32];
        chance.nextBytes(random);
        String secret = "lg_" + Base64.getUrlEncoder().withoutPadding().encodeToString(random);
        return new Made(store(actor, label.strip(), secret, scopes).orElseThrow(), secret);
    }

    /** Makes a token with every scope out of a given secret, when no token was ever made. */
    @Transactional
    Optional<Token> createFirst(String secret) {
        Locks.takeUntilCommit(jdbc, Locks.FIRST_TOKEN);
        boolean any = jdbc.sql("select exists (select 1 from token)")
                .query(Boolean.class)
                .single();
        return any
                ? Optional.empty()
                : store(Actor.system(SiteId.MAIN), "LEVELGAZE_BOOTSTRAP_TOKEN", secret, Set.of(Scope.values()));
    }

    /**
     * Ends a token at once.
     *
     * @throws Refusal {@code unknown-token} when there is none with this number that still holds
     */
    @Transactional
    public void revoke(Actor actor, long id) {
        int revoked = jdbc.sql("""
                update token set revoked_at = ? where site_id = ? and token_id = ? and revoked_at is null""")
                .params(OffsetDateTime.now(clock), actor.site().value(), id)
                .update();
        if (revoked == 0) {
            throw new Refusal(Refusal.Kind.NOT_FOUND, "unknown-token", Long.toString(id));
        }
        journal.record(actor, Act.of("token.revoked", "token:" + id, ""));
    }

    /** The token that has this secret and still holds; the day of its use is noted. */
    @Transactional
    Optional<Token> bySecret(String secret) {
        Optional<Token> found = jdbc.sql("select" + COLUMNS + "from token where digest = ? and revoked_at is null")
                .param(Digests.sha256(secret))
                .query(Tokens::read)
                .optional();
        LocalDate today = LocalDate.now(clock);
        found.filter(token -> !today.equals(token.lastUsedOn()))
                .ifPresent(token -> jdbc.sql("update token set last_used_on = ? where site_id = ? and token_id = ?")
                        .params(today, token.site().value(), token.id())
                        .update());
        return found;
    }

    private Optional<Token> store(Actor actor, String label, String secret, Set<Scope> scopes) {
        String codes = scopes.stream().sorted().map(Scope::code).collect(Collectors.joining(","));
        Token made = jdbc.sql("""
                insert into token (site_id, label, digest, scopes, created_at)
                values (?, ?, ?, string_to_array(?, ','), ?)
                returning""" + COLUMNS)
                .params(actor.site().value(), label, Digests.sha256(secret), codes, OffsetDateTime.now(clock))
                .query(Tokens::read)
                .single();
        journal.record(actor, Act.of("token.created", made.subject(), codes));
        return Optional.of(made);
    }

    private static Token read(ResultSet row, int number) throws SQLException {
        String[] scopes = (String[]) row.getArray("scopes").getArray();
        OffsetDateTime revokedAt = row.getObject("revoked_at", OffsetDateTime.class);
        return new Token(
                new SiteId(row.getInt("site_id")),
                row.getLong("token_id"),
                row.getString("label"),
                Arrays.stream(scopes).flatMap(code -> Scope.of(code).stream()).collect(Collectors.toSet()),
                Objects.requireNonNull(row.getObject("created_at", OffsetDateTime.class))
                        .toInstant(),
                row.getObject("last_used_on", LocalDate.class),
                revokedAt == null ? null : revokedAt.toInstant());
    }
}
