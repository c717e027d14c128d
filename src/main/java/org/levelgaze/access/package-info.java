/** Accounts, roles, tokens and sign-in: who may take which route. */
@ApplicationModule(allowedDependencies = {"journal"})
@NullMarked
package org.levelgaze.access;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.ApplicationModule;
