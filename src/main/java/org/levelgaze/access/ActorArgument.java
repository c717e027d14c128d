package org.levelgaze.access;

import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.Site;
import org.levelgaze.shared.Sites;
import org.springframework.core.MethodParameter;
import org.springframework.stereotype.Component;
import org.springframework.web.bind.support.WebDataBinderFactory;
import org.springframework.web.context.request.NativeWebRequest;
import org.springframework.web.method.support.HandlerMethodArgumentResolver;
import org.springframework.web.method.support.ModelAndViewContainer;

/** Gives a controller's method the {@link Actor}, the {@link Site} or the {@link Caller} of the request it answers. */
@Component
class ActorArgument implements HandlerMethodArgumentResolver {

    private final Sites sites;

    ActorArgument(Sites sites) {
        this.sites = sites;
    }

    @Override
    public boolean supportsParameter(MethodParameter parameter) {
        Class<?> type = parameter.getParameterType();
        return type == Actor.class || type == Site.class || type == Caller.class;
    }

    @Override
    public Object resolveArgument(
            MethodParameter parameter,
            @Nullable ModelAndViewContainer model,
            NativeWebRequest request,
            @Nullable WebDataBinderFactory binders) {
        if (!(request.getUserPrincipal() instanceof Caller caller)) {
            throw new IllegalStateException("A route that everybody may take has no actor: "
                    + parameter.getExecutable().toGenericString());
        }
        if (parameter.getParameterType() == Caller.class) {
            return caller;
        }
        return parameter.getParameterType() == Actor.class
                ? caller.actor()
                : sites.get(caller.actor().site());
    }
}
