/** Tests of the module {@code studies}, through its public types. */
@NullMarked
package org.levelgaze.studies;

import org.jspecify.annotations.NullMarked;
