/** Tests of the engine: published values, a second implementation, and properties over random studies. */
@NullMarked
package org.levelgaze.agreement;

import org.jspecify.annotations.NullMarked;
