/** What many tests share: one PostgreSQL for all of them, a clock that stands. */
@NullMarked
package org.levelgaze.testing;

import org.jspecify.annotations.NullMarked;
