package org.levelgaze;

import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.boot.context.event.ApplicationReadyEvent;
import org.springframework.context.event.EventListener;
import org.springframework.stereotype.Component;

/** Says on the console where the program can be opened. */
@Component
class ReadyLine {

    private static final Logger LOG = LoggerFactory.getLogger(ReadyLine.class);

    @EventListener
    void say(ApplicationReadyEvent ready) {
        String port = ready.getApplicationContext().getEnvironment().getProperty("local.server.port");
        if (port != null) {
            LOG.info("Levelgaze is ready: http://localhost:{}/", port);
        }
    }
}
