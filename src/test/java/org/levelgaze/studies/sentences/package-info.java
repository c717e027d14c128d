/** What the sentences say, read as they stand on the page. */
@NullMarked
package org.levelgaze.studies.sentences;

import org.jspecify.annotations.NullMarked;
