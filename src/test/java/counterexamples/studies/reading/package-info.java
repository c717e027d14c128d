/** Knows a framework where none is needed. */
@NullMarked
package counterexamples.studies.reading;

import org.jspecify.annotations.NullMarked;
