package org.levelgaze.studies.sentences;

/** Gives the sentences their words in one language, from the message bundle {@code studies}. */
@FunctionalInterface
public interface Phrases {

    /**
     * One sentence or label.
     *
     * @param key a key of the bundle
     * @param arguments what it names, figures already written in the language
     */
    String of(String key, Object... arguments);
}
