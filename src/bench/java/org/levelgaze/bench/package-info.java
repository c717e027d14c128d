/** Benchmarks, run on demand; each prints ratios to a floor measured in the same run. */
@NullMarked
package org.levelgaze.bench;

import org.jspecify.annotations.NullMarked;
