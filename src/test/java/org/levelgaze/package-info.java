/** Tests of the whole. */
@NullMarked
package org.levelgaze;

import org.jspecify.annotations.NullMarked;
