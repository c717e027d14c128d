package org.levelgaze.access;

import org.springframework.boot.tomcat.servlet.TomcatServletWebServerFactory;
import org.springframework.boot.web.server.WebServerFactoryCustomizer;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.security.web.firewall.HttpFirewall;
import org.springframework.security.web.firewall.StrictHttpFirewall;

/**
 * Codes are a site's own and kept as written, so they may hold a slash, a percent sign or a backslash, and they stand in
 * addresses. Encoded, such a sign belongs to the code; routes and rights are both decided on the address as it was sent, so
 * that one cannot see another path than the other.
 */
@Configuration(proxyBeanMethods = false)
class CodesInAddresses {

    private static final String LEFT_AS_IT_IS = "passthrough";

    @Bean
    HttpFirewall firewall() {
        StrictHttpFirewall firewall = new StrictHttpFirewall();
        firewall.setAllowUrlEncodedSlash(true);
        firewall.setAllowUrlEncodedDoubleSlash(true);
        firewall.setAllowUrlEncodedPercent(true);
        firewall.setAllowBackSlash(true);
        return firewall;
    }

    @Bean
    WebServerFactoryCustomizer<TomcatServletWebServerFactory> encodedSlashes() {
        return server -> server.addConnectorCustomizers(connector -> {
            connector.setEncodedSolidusHandling(LEFT_AS_IT_IS);
            connector.setEncodedReverseSolidusHandling(LEFT_AS_IT_IS);
        });
    }
}
