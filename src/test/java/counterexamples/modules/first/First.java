package counterexamples.modules.first;

import counterexamples.modules.second.Second;

/** Uses a module that it must not use. */
public record First(Second second) {}
