/** Knows a framework where words are handed in. */
@NullMarked
package counterexamples.studies.sentences;

import org.jspecify.annotations.NullMarked;
