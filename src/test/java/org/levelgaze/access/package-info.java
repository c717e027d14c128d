/** Tests of accounts, roles, tokens and sign-in. */
@NullMarked
package org.levelgaze.access;

import org.jspecify.annotations.NullMarked;
