/** Tests of the pictures. */
@NullMarked
package org.levelgaze.plot;

import org.jspecify.annotations.NullMarked;
