/** The jobs that users do, done in a real browser against the whole program. */
@NullMarked
package org.levelgaze.browser;

import org.jspecify.annotations.NullMarked;
