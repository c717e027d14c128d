/**
 * Calls in, findings out: effectiveness, false accepts and false rejects, bias, kappa and their intervals.
 *
 * <p>Pure: no framework, no database, no clock, no other module. {@link org.levelgaze.agreement.Engine} takes a
 * {@link org.levelgaze.agreement.Study} and gives {@link org.levelgaze.agreement.Findings}; every result type says which
 * method it follows and where that comes from. The types are public because pages, papers and the API show them.
 */
@ApplicationModule(allowedDependencies = {})
@NullMarked
package org.levelgaze.agreement;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
