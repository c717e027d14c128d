/** The pages of studies, by the text that a reader sees. */
@NullMarked
package org.levelgaze.studies.pages;

import org.jspecify.annotations.NullMarked;
