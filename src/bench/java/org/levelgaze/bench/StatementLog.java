package org.levelgaze.bench;

import ch.qos.logback.classic.Level;
import ch.qos.logback.classic.Logger;
import ch.qos.logback.classic.spi.ILoggingEvent;
import ch.qos.logback.core.AppenderBase;
import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.slf4j.LoggerFactory;

/**
 * Listens to what is said to the database, by the logs of JdbcTemplate and Hibernate. Begin and commit are not counted. For
 * single requests: while it listens the program is slower.
 */
final class StatementLog extends AppenderBase<ILoggingEvent> {

    private static final List<String> SPEAKERS =
            List.of("org.springframework.jdbc.core.JdbcTemplate", "org.hibernate.SQL");
    private static final int SHOWN = 100;

    private final List<String> statements = Collections.synchronizedList(new ArrayList<>());

    private StatementLog() {}

    /** The statements during some work, each with how often it was sent. */
    static Map<String, Integer> during(Measured.Work work) throws Exception {
        StatementLog log = new StatementLog();
        log.start();
        SPEAKERS.forEach(log::listen);
        work.run();
        SPEAKERS.forEach(log::stopListening);
        Map<String, Integer> counts = new LinkedHashMap<>();
        log.statements.forEach(statement -> counts.merge(statement, 1, Integer::sum));
        return counts;
    }

    private void listen(String speaker) {
        Logger logger = (Logger) LoggerFactory.getLogger(speaker);
        logger.setLevel(Level.DEBUG);
        logger.setAdditive(false);
        logger.addAppender(this);
    }

    private void stopListening(String speaker) {
        Logger logger = (Logger) LoggerFactory.getLogger(speaker);
        logger.detachAppender(this);
        logger.setAdditive(true);
        logger.setLevel(null);
    }

    @Override
    protected void append(ILoggingEvent event) {
        String said = event.getFormattedMessage();
        int from = said.indexOf('[');
        boolean fromTemplate = said.startsWith("Executing");
        if (fromTemplate && from < 0) {
            return;
        }
        String sql = fromTemplate ? said.substring(from + 1, said.length() - 1) : said;
        String line = sql.replaceAll("\\s+", " ").strip();
        statements.add(line.length() > SHOWN ? line.substring(0, SHOWN) + "…" : line);
    }
}
