/** Imports as a user sees them: pages, questions, bad rows, two tabs at once. */
@NullMarked
package org.levelgaze.studies.importing;

import org.jspecify.annotations.NullMarked;
