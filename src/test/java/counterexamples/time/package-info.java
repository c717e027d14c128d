/** Looks at the machine's clock. */
@NullMarked
package counterexamples.time;

import org.jspecify.annotations.NullMarked;
