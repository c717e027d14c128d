package counterexamples.plot;

import java.sql.Connection;
import java.sql.SQLException;

/** Asks the database. */
class KnowsTheDatabase {

    boolean open(Connection connection) throws SQLException {
        return connection.isValid(1);
    }
}
