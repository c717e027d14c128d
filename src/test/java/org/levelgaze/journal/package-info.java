/** Tests of the journal, against a real database. */
@NullMarked
package org.levelgaze.journal;

import org.jspecify.annotations.NullMarked;
