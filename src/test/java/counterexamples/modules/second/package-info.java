/** Used where it must not be. */
@NullMarked
package counterexamples.modules.second;

import org.jspecify.annotations.NullMarked;
