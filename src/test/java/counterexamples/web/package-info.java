/** Shows others its pages. */
@NullMarked
package counterexamples.web;

import org.jspecify.annotations.NullMarked;
