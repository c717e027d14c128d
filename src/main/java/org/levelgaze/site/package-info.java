/** The shell: home page, navigation, languages, errors. */
@NullMarked
package org.levelgaze.site;

import org.jspecify.annotations.NullMarked;
