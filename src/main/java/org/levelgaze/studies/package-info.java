/** Studies: import, stored calls, findings, and what they show. */
@ApplicationModule(allowedDependencies = {"register", "sets", "agreement", "plot", "journal"})
@NullMarked
package org.levelgaze.studies;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
