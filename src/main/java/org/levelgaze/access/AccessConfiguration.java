package org.levelgaze.access;

import java.util.List;
import org.springdoc.core.utils.SpringDocUtils;
import org.springframework.context.annotation.Configuration;
import org.springframework.web.method.support.HandlerMethodArgumentResolver;
import org.springframework.web.servlet.config.annotation.WebMvcConfigurer;

/** What controllers of every module are given by this one. */
@Configuration(proxyBeanMethods = false)
class AccessConfiguration implements WebMvcConfigurer {

    static {
        SpringDocUtils.getConfig()
                .addRequestWrapperToIgnore(
                        org.levelgaze.journal.Actor.class, org.levelgaze.shared.Site.class, Caller.class);
    }

    private final ActorArgument actor;

    AccessConfiguration(ActorArgument actor) {
        this.actor = actor;
    }

    @Override
    public void addArgumentResolvers(List<HandlerMethodArgumentResolver> resolvers) {
        resolvers.add(actor);
    }
}
