/** The database the program runs on: its own PostgreSQL, or one that is named to it. */
@ApplicationModule(allowedDependencies = {})
@NullMarked
package org.levelgaze.database;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
