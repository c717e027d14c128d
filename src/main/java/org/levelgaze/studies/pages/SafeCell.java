package org.levelgaze.studies.pages;

/**
 * Text for a cell that a spreadsheet may open: what it could take for a formula is written as text, with a leading
 * apostrophe. (OWASP, CSV Injection: = + - @, tab and carriage return.)
 */
final class SafeCell {

    private static final String STARTS_OF_FORMULAS = "=+-@\t\r";

    private SafeCell() {}

    static String of(String text) {
        return !text.isEmpty() && STARTS_OF_FORMULAS.indexOf(text.charAt(0)) >= 0 ? "'" + text : text;
    }
}
