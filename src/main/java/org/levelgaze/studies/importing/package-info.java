/** The way of a file from somebody's disk to a stored study: kept, asked about, read in the background, stored. */
@NullMarked
package org.levelgaze.studies.importing;

import org.jspecify.annotations.NullMarked;
