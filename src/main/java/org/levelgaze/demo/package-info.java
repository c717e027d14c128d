/** An invented plant with two years of history, made through the calls that a user's clicks make. */
@NullMarked
package org.levelgaze.demo;

import org.jspecify.annotations.NullMarked;
