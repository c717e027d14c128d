/**
 * Numbers in, SVG out: lean scale, mistake plane, trend and piece ladder, the same for page and paper.
 *
 * <p>Pure: no framework, no database, no clock, no other module.
 */
@ApplicationModule(allowedDependencies = {})
@NullMarked
package org.levelgaze.plot;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
