/** Tests of the module {@code sets}, through its public types. */
@NullMarked
package org.levelgaze.sets;

import org.jspecify.annotations.NullMarked;
