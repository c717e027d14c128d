/** Values that every module speaks of: the site, its calendar, and a refusal that names the thing, the place and the way out. */
@ApplicationModule(allowedDependencies = {})
@NullMarked
package org.levelgaze.shared;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
