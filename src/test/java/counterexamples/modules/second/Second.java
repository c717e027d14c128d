package counterexamples.modules.second;

/** Anything. */
public record Second() {}
