/** What findings say in plain sentences, before any number. Pure: findings and words in, sentences out. */
@NullMarked
package org.levelgaze.studies.sentences;

import org.jspecify.annotations.NullMarked;
