package org.levelgaze.database;

import java.sql.Connection;
import java.sql.SQLException;
import java.sql.Statement;
import org.springframework.boot.SpringApplication;
import org.springframework.boot.WebApplicationType;
import org.springframework.context.ConfigurableApplicationContext;

/** A program to be killed: says the number of each row after its commit, without end. */
final class CommittingProgram {

    static final String TABLE = "acknowledged";

    private CommittingProgram() {}

    public static void main(String[] arguments) throws SQLException {
        SpringApplication program = new SpringApplication(DatabaseConfiguration.class);
        program.setWebApplicationType(WebApplicationType.NONE);
        ConfigurableApplicationContext context = program.run(arguments);
        Access access = context.getBean(Database.class).access();
        Connections.use(access.url(), access.owner(), CommittingProgram::commitWithoutEnd);
    }

    /** Commits row after row and says so. */
    @SuppressWarnings("SystemOut")
    private static void commitWithoutEnd(Connection connection) throws SQLException {
        createTable(connection);
        for (int number = 1; ; number++) {
            insert(connection, number);
            System.out.println(number);
        }
    }

    static void createTable(Connection connection) throws SQLException {
        Connections.execute(connection, "create table " + TABLE + " (number int)");
    }

    static void insert(Connection connection, int number) throws SQLException {
        try (Statement statement = connection.createStatement()) {
            statement.executeUpdate("insert into " + TABLE + " values (" + number + ")");
        }
    }
}
