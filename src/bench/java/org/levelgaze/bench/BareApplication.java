package org.levelgaze.bench;

import org.springframework.boot.SpringApplication;
import org.springframework.boot.autoconfigure.EnableAutoConfiguration;
import org.springframework.web.servlet.config.annotation.ViewControllerRegistry;
import org.springframework.web.servlet.config.annotation.WebMvcConfigurer;

/**
 * The least that Spring Boot serves a Thymeleaf page with. Not a component on purpose: the program must not find it when it
 * looks for its own.
 */
@EnableAutoConfiguration
public class BareApplication implements WebMvcConfigurer {

    /** Starts it. */
    public static void main(String[] arguments) {
        SpringApplication.run(BareApplication.class, arguments);
    }

    @Override
    public void addViewControllers(ViewControllerRegistry pages) {
        pages.addViewController("/").setViewName("bench/bare");
    }
}
