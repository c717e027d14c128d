/** Names that say nothing, and objects that change under one's hands. */
@NullMarked
package counterexamples.words;

import org.jspecify.annotations.NullMarked;
