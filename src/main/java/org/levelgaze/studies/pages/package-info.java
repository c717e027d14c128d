/** What a reader sees of stored studies: lists, a study, its summary, ladder and downloads, and appraisers over time. */
@NullMarked
package org.levelgaze.studies.pages;

import org.jspecify.annotations.NullMarked;
