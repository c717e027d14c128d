package org.levelgaze.cli;

import org.springframework.boot.autoconfigure.EnableAutoConfiguration;
import org.springframework.context.annotation.ComponentScan;
import org.springframework.context.annotation.FilterType;
import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.ControllerAdvice;

/**
 * The part of the program that {@code verify} needs: the stores and what computes from them, without doors and pages. It is
 * no configuration of the web application, which therefore does not find it.
 */
@EnableAutoConfiguration
@ComponentScan(
        basePackages = "org.levelgaze",
        excludeFilters = {
            @ComponentScan.Filter(
                    type = FilterType.REGEX,
                    pattern = {"org\\.levelgaze\\.Levelgaze", "org\\.levelgaze\\.(access|site|demo|cli)\\..*"}),
            @ComponentScan.Filter({Controller.class, ControllerAdvice.class})
        })
class VerifyConfiguration {}
