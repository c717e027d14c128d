/** Tests of the module {@code register}, through its public types. */
@NullMarked
package org.levelgaze.register;

import org.jspecify.annotations.NullMarked;
