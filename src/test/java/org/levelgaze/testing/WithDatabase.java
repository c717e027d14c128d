package org.levelgaze.testing;

import java.lang.annotation.ElementType;
import java.lang.annotation.Inherited;
import java.lang.annotation.Retention;
import java.lang.annotation.RetentionPolicy;
import java.lang.annotation.Target;
import org.springframework.boot.test.util.TestPropertyValues;
import org.springframework.context.ApplicationContextInitializer;
import org.springframework.context.ConfigurableApplicationContext;
import org.springframework.test.context.ContextConfiguration;

/** Gives the test's context a database of its own, migrated and empty. */
@Target(ElementType.TYPE)
@Retention(RetentionPolicy.RUNTIME)
@Inherited
@ContextConfiguration(initializers = WithDatabase.Initializer.class)
public @interface WithDatabase {

    /** Points the context at a fresh copy of the template. */
    final class Initializer implements ApplicationContextInitializer<ConfigurableApplicationContext> {

        @Override
        public void initialize(ConfigurableApplicationContext context) {
            String url = SharedPostgres.fresh();
            TestPropertyValues.of(
                            "spring.datasource.url=" + url,
                            "spring.datasource.username=" + SharedPostgres.APPLICATION,
                            "spring.datasource.password=app",
                            "spring.flyway.url=" + url,
                            "spring.flyway.user=" + SharedPostgres.OWNER,
                            "spring.flyway.password=owner",
                            "spring.flyway.placeholders.appRole=" + SharedPostgres.APPLICATION)
                    .applyTo(context);
        }
    }
}
