/** A program whose modules break their own rules. */
@NullMarked
package counterexamples.modules;

import org.jspecify.annotations.NullMarked;
