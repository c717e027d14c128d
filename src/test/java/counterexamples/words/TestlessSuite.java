package counterexamples.words;

import org.junit.jupiter.api.Test;

/** A test that no build runs, because of its name. */
class TestlessSuite {

    @Test
    void neverRuns() {}
}
