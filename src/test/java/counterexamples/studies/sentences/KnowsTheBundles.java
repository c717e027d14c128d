package counterexamples.studies.sentences;

import org.springframework.context.MessageSource;

/** Looks its words up by itself. */
record KnowsTheBundles(MessageSource messages) {}
