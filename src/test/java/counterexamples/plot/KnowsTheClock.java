package counterexamples.plot;

import java.time.Clock;

/** Could find out what day it is. */
class KnowsTheClock {

    long millis(Clock clock) {
        return clock.millis();
    }
}
