package org.levelgaze.access;

import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.beans.factory.SmartInitializingSingleton;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.stereotype.Component;

/**
 * Makes the token that {@code LEVELGAZE_BOOTSTRAP_TOKEN} names, with every scope, when no token was ever made: a program can
 * set up the plant before the first person has an account. Done before the first request is answered.
 */
@Component
class BootstrapToken implements SmartInitializingSingleton {

    private static final Logger LOG = LoggerFactory.getLogger(BootstrapToken.class);
    private static final int SHORT = 32;

    private final Tokens tokens;
    private final String secret;

    BootstrapToken(Tokens tokens, @Value("${levelgaze.bootstrap-token:}") String secret) {
        this.tokens = tokens;
        this.secret = secret.strip();
    }

    @Override
    public void afterSingletonsInstantiated() {
        if (secret.isEmpty()) {
            return;
        }
        if (secret.length() < SHORT) {
            LOG.warn("LEVELGAZE_BOOTSTRAP_TOKEN has fewer than {} characters and may be guessed", SHORT);
        }
        tokens.createFirst(secret)
                .ifPresent(made -> LOG.info("Made {} out of LEVELGAZE_BOOTSTRAP_TOKEN", made.subject()));
    }
}
