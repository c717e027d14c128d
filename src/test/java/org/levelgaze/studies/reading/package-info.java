/**
 * Tests of the reading of files. In a test run this file stands before the program's own of the same name, so it must
 * expose the package as that one does.
 */
@NamedInterface("reading")
@NullMarked
package org.levelgaze.studies.reading;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.NamedInterface;
