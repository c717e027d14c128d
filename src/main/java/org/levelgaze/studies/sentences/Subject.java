package org.levelgaze.studies.sentences;

/**
 * Whom the sentences speak of.
 *
 * @param name as it stands on screen
 * @param isCamera a camera, else a person
 * @param trials how many trials were made
 */
public record Subject(String name, boolean isCamera, int trials) {}
