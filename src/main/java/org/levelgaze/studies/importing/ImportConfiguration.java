package org.levelgaze.studies.importing;

import org.springframework.context.annotation.Configuration;
import org.springframework.scheduling.annotation.EnableScheduling;

/** Lets imports give signs of life and old uploads be forgotten. */
@Configuration(proxyBeanMethods = false)
@EnableScheduling
class ImportConfiguration {}
