package org.levelgaze.bench;

import org.springframework.web.servlet.config.annotation.ViewControllerRegistry;
import org.springframework.web.servlet.config.annotation.WebMvcConfigurer;

/**
 * Two pages without content in the running program: one of a heading alone, and one in the frame that all pages have. Their
 * addresses lie below one that is open to signed-in administrators.
 */
final class EmptyPages implements WebMvcConfigurer {

    static final String EMPTY = "/settings/empty";
    static final String FRAME = "/settings/frame";

    @Override
    public void addViewControllers(ViewControllerRegistry pages) {
        pages.addViewController(EMPTY).setViewName("bench/empty");
        pages.addViewController(FRAME).setViewName("bench/frame");
    }
}
