/** Knows the database where nothing but numbers is allowed. */
@NullMarked
package counterexamples.plot;

import org.jspecify.annotations.NullMarked;
