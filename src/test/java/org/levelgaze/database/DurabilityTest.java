package org.levelgaze.database;

import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.sql.SQLException;
import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.FieldSource;
import org.levelgaze.testing.SharedPostgres;

/** The tests' own server has all of these off, for speed. */
class DurabilityTest {

    static final List<String> SETTINGS = Durability.SETTINGS;

    @ParameterizedTest
    @FieldSource("SETTINGS")
    void refusesAServerWithOneOfItsSettingsOff(String setting) throws SQLException {
        Login login = new Login(SharedPostgres.APPLICATION, "app");

        Connections.use(
                SharedPostgres.fresh(),
                login,
                connection -> assertThatThrownBy(() -> Durability.demand(connection, setting))
                        .isInstanceOf(DatabaseRefusal.class)
                        .hasMessage(
                                "PostgreSQL runs with " + setting + " = off: it could lose what it has acknowledged."));
    }
}
