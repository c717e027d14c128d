/**
 * Calls in, findings out: effectiveness, false accepts and false rejects, bias, kappa and their intervals.
 *
 * <p>Pure: no framework, no database, no clock, no other module.
 */
@NullMarked
package org.levelgaze.agreement;

import org.jspecify.annotations.NullMarked;
