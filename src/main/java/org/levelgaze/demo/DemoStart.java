package org.levelgaze.demo;

import org.levelgaze.shared.SiteId;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.boot.ApplicationArguments;
import org.springframework.boot.ApplicationRunner;
import org.springframework.boot.autoconfigure.condition.ConditionalOnBooleanProperty;
import org.springframework.stereotype.Component;

/** Makes the invented plant when the switch {@code LEVELGAZE_DEMO=true} is set. */
@Component
@ConditionalOnBooleanProperty("levelgaze.demo")
class DemoStart implements ApplicationRunner {

    private static final Logger LOG = LoggerFactory.getLogger(DemoStart.class);

    private final DemoPlant plant;

    DemoStart(DemoPlant plant) {
        this.plant = plant;
    }

    @Override
    public void run(ApplicationArguments arguments) {
        LOG.info("Making the demo plant, Tarnhollow Stoneware");
        boolean made = plant.make(SiteId.MAIN);
        LOG.info(made ? "The demo plant is there" : "There is a plant already; the demo was left out");
    }
}
