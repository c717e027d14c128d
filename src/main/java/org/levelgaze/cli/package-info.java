/** The commands of the jar that need no web: assess, verify, token. */
@NullMarked
package org.levelgaze.cli;

import org.jspecify.annotations.NullMarked;
