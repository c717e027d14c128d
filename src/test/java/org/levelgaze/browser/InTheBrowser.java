package org.levelgaze.browser;

import java.lang.annotation.ElementType;
import java.lang.annotation.Retention;
import java.lang.annotation.RetentionPolicy;
import java.lang.annotation.Target;
import org.junit.jupiter.api.extension.ExtendWith;
import org.levelgaze.testing.Chromium;

/** A test of what somebody does in a browser; it may ask for the {@link Plant} that all such tests share. */
@Target(ElementType.TYPE)
@Retention(RetentionPolicy.RUNTIME)
@ExtendWith({Chromium.Present.class, OnePlant.class})
@interface InTheBrowser {}
