/** Reference sets: pieces, true states, editions, and who has seen the answer key. */
@ApplicationModule(allowedDependencies = {"register", "agreement", "journal"})
@NullMarked
package org.levelgaze.sets;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
