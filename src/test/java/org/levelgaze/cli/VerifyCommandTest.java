package org.levelgaze.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import java.io.InputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.sql.Connection;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.levelgaze.testing.SharedPostgres;

class VerifyCommandTest {

    private final ByteArrayOutputStream out = new ByteArrayOutputStream();
    private final String url = SharedPostgres.fresh();
    private final Map<String, String> settings = Map.of(
            "spring.datasource.url",
            url,
            "spring.datasource.username",
            SharedPostgres.APPLICATION,
            "spring.datasource.password",
            "app",
            "spring.flyway.user",
            SharedPostgres.OWNER,
            "spring.flyway.password",
            "owner",
            "spring.flyway.url",
            url,
            "spring.flyway.placeholders.appRole",
            SharedPostgres.APPLICATION);

    @BeforeEach
    void settings() {
        settings.forEach(System::setProperty);
    }

    @AfterEach
    void noSettings() {
        settings.keySet().forEach(System::clearProperty);
    }

    @Test
    void saysThatEverythingHolds() throws SQLException {
        asOwner(
                "insert into journal_entry (site_id, actor, act, subject, payload_digest) values (1, 'system', 'a.b', 'c:1', sha256('x'))");

        assertThat(verify()).isEqualTo(Commands.DONE);
        assertThat(printed())
                .contains(
                        "Site MAIN: the journal is intact, 1 entries.",
                        "0 studies computed anew, 0 differ",
                        "Everything that is stored follows from its facts.");
    }

    @Test
    void namesTheFirstEntryThatWasChangedBehindTheProgram() throws SQLException {
        asOwner(
                "insert into journal_entry (site_id, actor, act, subject, payload_digest) select 1, 'system', 'a.b', 'c:' || n, sha256('x') from generate_series(1, 3) n",
                "alter table journal_entry disable trigger user",
                "update journal_entry set act = 'a.c' where seq = 2");

        assertThat(verify()).isEqualTo(Commands.BROKEN);
        assertThat(printed()).contains("THE JOURNAL IS BROKEN. The first entry that is changed or missing is 2.");
    }

    @Test
    void takesNoArguments() {
        Console console = console();

        assertThat(new VerifyCommand(console).run(List.of("--all"))).isEqualTo(Commands.REFUSED);
        assertThat(printed()).startsWith("Usage:");
    }

    private int verify() {
        return new VerifyCommand(console()).run(List.of());
    }

    private Console console() {
        PrintStream stream = new PrintStream(out, true, StandardCharsets.UTF_8);
        return new Console(InputStream.nullInputStream(), stream, stream, Locale.ENGLISH);
    }

    private String printed() {
        return out.toString(StandardCharsets.UTF_8);
    }

    private void asOwner(String... statements) throws SQLException {
        try (Connection owner = SharedPostgres.owner(url);
                Statement statement = owner.createStatement()) {
            for (String sql : statements) {
                statement.execute(sql);
            }
        }
    }
}
