/** Knows a framework and another module where neither is allowed. */
@NullMarked
package counterexamples.agreement;

import org.jspecify.annotations.NullMarked;
