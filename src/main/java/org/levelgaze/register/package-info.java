/** Tasks with their defect kinds, and appraisers: people, and cameras with their configurations. */
@ApplicationModule(allowedDependencies = {"journal"})
@NullMarked
package org.levelgaze.register;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
