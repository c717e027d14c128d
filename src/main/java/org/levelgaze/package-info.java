/** Levelgaze: who may judge good from defective, on which reference set, and how well. One package below this one is one module. */
@NullMarked
package org.levelgaze;

import org.jspecify.annotations.NullMarked;
