/** Shows others what it stores in. */
@NullMarked
package counterexamples.storage;

import org.jspecify.annotations.NullMarked;
