package counterexamples.modules;

import org.springframework.modulith.Modulithic;

/** Two modules, and an arrow that neither declares. */
@Modulithic
public class WrongArrows {}
