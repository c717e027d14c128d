/** Tests of the commands. */
@NullMarked
package org.levelgaze.cli;

import org.jspecify.annotations.NullMarked;
