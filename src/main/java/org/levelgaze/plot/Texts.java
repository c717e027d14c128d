package org.levelgaze.plot;

/** Gives the pictures their words in one language, from the message bundle {@code plot}. */
@FunctionalInterface
public interface Texts {

    /**
     * One sentence or label.
     *
     * @param key a key of the bundle, beginning with {@code plot.}
     * @param arguments what it names, already written in the language
     */
    String of(String key, Object... arguments);
}
