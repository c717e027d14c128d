/** The database under kills, wrong folders and wrong rights, on real servers. */
@NullMarked
package org.levelgaze.database;

import org.jspecify.annotations.NullMarked;
