package counterexamples.words;

import org.junit.jupiter.api.Test;

/** A test that no build runs, because of its name. */
class SuiteOfNothing {

    @Test
    void neverRuns() {}
}
