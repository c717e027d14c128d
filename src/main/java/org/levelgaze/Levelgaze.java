package org.levelgaze;

import java.util.OptionalInt;
import org.levelgaze.cli.Commands;
import org.springframework.boot.SpringApplication;
import org.springframework.boot.autoconfigure.SpringBootApplication;
import org.springframework.modulith.Modulithic;

/** The program: the web application, or one of its commands when the first argument names one. */
@SpringBootApplication
@Modulithic(systemName = "Levelgaze", sharedModules = "shared")
public class Levelgaze {

    /**
     * Runs the command that the first argument names, or starts the web application.
     *
     * @param arguments a command and what it takes, or Spring Boot's own
     */
    public static void main(String[] arguments) {
        OptionalInt code = Commands.run(arguments);
        if (code.isPresent()) {
            System.exit(code.getAsInt());
        }
        SpringApplication.run(Levelgaze.class, arguments);
    }
}
