/** The append-only, hash-chained record of every act. */
@ApplicationModule(allowedDependencies = {})
@NullMarked
package org.levelgaze.journal;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
