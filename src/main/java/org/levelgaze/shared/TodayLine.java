package org.levelgaze.shared;

import java.util.List;

/**
 * One thing that needs a hand today: a sentence with one button.
 *
 * @param sentence the key of the sentence in the message bundles
 * @param arguments what the sentence names, in its order
 * @param button the key of the button's text in the message bundles
 * @param href where the button leads, from the root of the application
 */
public record TodayLine(String sentence, List<?> arguments, String button, String href) {

    /** Keeps its own copy of the arguments. */
    public TodayLine {
        arguments = List.copyOf(arguments);
    }
}
