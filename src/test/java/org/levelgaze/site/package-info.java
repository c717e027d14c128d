/** Tests of the shell. */
@NullMarked
package org.levelgaze.site;

import org.jspecify.annotations.NullMarked;
