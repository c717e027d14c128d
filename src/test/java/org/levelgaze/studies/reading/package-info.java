/** Tests of the reading of files. */
@NullMarked
package org.levelgaze.studies.reading;

import org.jspecify.annotations.NullMarked;
