package counterexamples.time;

import java.time.Clock;
import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneId;
import java.util.Date;

/** Every way to get at the time without being given it. */
@SuppressWarnings({"JavaTimeDefaultTimeZone", "JavaUtilDate", "TimeInStaticInitializer"})
class LooksAtTheWall {

    LocalDate today() {
        return LocalDate.now();
    }

    LocalDate todayThere() {
        return LocalDate.now(ZoneId.of("Europe/Berlin"));
    }

    Instant instant() {
        return Instant.now();
    }

    long millis() {
        return System.currentTimeMillis();
    }

    Date date() {
        return new Date();
    }

    Clock clock() {
        return Clock.systemUTC();
    }

    ZoneId zone() {
        return ZoneId.systemDefault();
    }
}
