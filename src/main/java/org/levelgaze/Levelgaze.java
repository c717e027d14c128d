package org.levelgaze;

import org.springframework.boot.SpringApplication;
import org.springframework.boot.autoconfigure.SpringBootApplication;
import org.springframework.modulith.Modulithic;

/** The program: the web application, or one of its commands when the first argument names one. */
@SpringBootApplication
@Modulithic(systemName = "Levelgaze", sharedModules = "shared")
public class Levelgaze {

    /**
     * Starts the web application.
     *
     * @param arguments Spring Boot's own
     */
    public static void main(String[] arguments) {
        SpringApplication.run(Levelgaze.class, arguments);
    }
}
