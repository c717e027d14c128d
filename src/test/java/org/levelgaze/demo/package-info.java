/** Tests of the module {@code demo}. */
@NullMarked
package org.levelgaze.demo;

import org.jspecify.annotations.NullMarked;
