/** What the architecture's rules forbid: each rule must find its own. Outside the program's package, so that no scan meets them. */
@NullMarked
package counterexamples;

import org.jspecify.annotations.NullMarked;
