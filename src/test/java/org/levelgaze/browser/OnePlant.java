package org.levelgaze.browser;

import org.junit.jupiter.api.extension.ExtensionContext;
import org.junit.jupiter.api.extension.ParameterContext;
import org.junit.jupiter.api.extension.ParameterResolver;

/** Gives every test of a run the same plant; the first that asks starts it, the end of the run stops it. */
final class OnePlant implements ParameterResolver {

    @Override
    public boolean supportsParameter(ParameterContext parameter, ExtensionContext test) {
        return parameter.getParameter().getType() == Plant.class;
    }

    @Override
    public Plant resolveParameter(ParameterContext parameter, ExtensionContext test) {
        return test.getRoot()
                .getStore(ExtensionContext.Namespace.create(OnePlant.class))
                .computeIfAbsent(Plant.class, first -> Plant.start(), Plant.class);
    }
}
