package org.levelgaze.studies.importing;

import org.levelgaze.studies.reading.Layout;
import org.levelgaze.studies.reading.Words;

/**
 * What the columns and words of a file mean.
 *
 * @param layout which column is what
 * @param words which words mean what
 */
record Mapping(Layout layout, Words words) {}
