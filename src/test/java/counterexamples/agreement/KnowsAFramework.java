package counterexamples.agreement;

import counterexamples.words.Mutable;
import org.springframework.util.StringUtils;

/** Uses Spring, and a type of another module. */
class KnowsAFramework {

    boolean anything(Mutable other) {
        return StringUtils.hasText(other.toString());
    }
}
