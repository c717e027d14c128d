/** Reads files of calls: finds delimiter and columns, names every bad row, keeps nothing half. Needs no framework. */
@NamedInterface("reading")
@NullMarked
package org.levelgaze.studies.reading;

import org.jspecify.annotations.NullMarked;
import org.springframework.modulith.NamedInterface;
