package org.levelgaze.studies;

/**
 * Text for a cell that a spreadsheet may open: what it could take for a formula is written as text, with a leading
 * apostrophe. (OWASP, CSV Injection: = + - @, tab and line ends.)
 */
public final class SafeCell {

    private static final String STARTS_OF_FORMULAS = "=+-@\t\r\n";

    private SafeCell() {}

    /** The text, made safe where it has to be. */
    public static String of(String text) {
        return !text.isEmpty() && STARTS_OF_FORMULAS.indexOf(text.charAt(0)) >= 0 ? "'" + text : text;
    }
}
