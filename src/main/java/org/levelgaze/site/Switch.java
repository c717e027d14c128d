package org.levelgaze.site;

/**
 * One way to show the page, offered in the footer.
 *
 * @param value the language or the brightness
 * @param href this page shown that way
 * @param chosen whether it is shown that way now
 */
record Switch(String value, String href, boolean chosen) {}
