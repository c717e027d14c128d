package org.levelgaze.cli;

import java.util.ArrayList;
import java.util.List;

/** Plain text of at most 80 columns: titles, paragraphs, tables. */
final class Page {

    static final int WIDTH = 80;

    private static final int INDENT = 2;
    private static final int GAP = 2;
    private static final int NARROWEST_NAME = 6;

    private final StringBuilder text = new StringBuilder();

    void title(String title) {
        if (text.length() > 0) {
            text.append('\n');
        }
        paragraph(0, title);
    }

    /** A sentence or more, broken at blanks. */
    void sentence(String sentence) {
        paragraph(INDENT, sentence);
    }

    /** Rows of equally many cells: the first to the left and shortened when need be, the others to the right. */
    void table(List<List<String>> rows) {
        int[] widths = new int[rows.get(0).size()];
        for (List<String> row : rows) {
            for (int at = 0; at < widths.length; at++) {
                widths[at] = Math.max(widths[at], length(row.get(at)));
            }
        }
        int others = INDENT + GAP * (widths.length - 1);
        for (int at = 1; at < widths.length; at++) {
            others += widths[at];
        }
        widths[0] = Math.max(NARROWEST_NAME, Math.min(widths[0], WIDTH - others));
        for (List<String> row : rows) {
            StringBuilder line = new StringBuilder(" ".repeat(INDENT));
            line.append(padded(shortened(row.get(0), widths[0]), widths[0], false));
            for (int at = 1; at < widths.length; at++) {
                line.append(" ".repeat(GAP)).append(padded(row.get(at), widths[at], true));
            }
            text.append(line.toString().stripTrailing()).append('\n');
        }
    }

    String text() {
        return text.toString();
    }

    private void paragraph(int indent, String words) {
        int room = WIDTH - indent;
        StringBuilder line = new StringBuilder();
        for (String word : pieces(words, room)) {
            if (line.length() > 0 && length(line) + 1 + length(word) > room) {
                flush(indent, line);
            }
            line.append(line.length() > 0 ? " " : "").append(word);
        }
        flush(indent, line);
    }

    private void flush(int indent, StringBuilder line) {
        text.append(" ".repeat(indent)).append(line).append('\n');
        line.setLength(0);
    }

    /** The words, those wider than a line in pieces. */
    private static List<String> pieces(String words, int room) {
        List<String> pieces = new ArrayList<>();
        for (String word : words.strip().split(" +", -1)) {
            String rest = word;
            while (length(rest) > room) {
                int end = rest.offsetByCodePoints(0, room);
                pieces.add(rest.substring(0, end));
                rest = rest.substring(end);
            }
            pieces.add(rest);
        }
        return pieces;
    }

    private static String shortened(String name, int width) {
        return length(name) <= width ? name : name.substring(0, name.offsetByCodePoints(0, width - 1)) + "…";
    }

    private static String padded(String cell, int width, boolean right) {
        String blanks = " ".repeat(Math.max(0, width - length(cell)));
        return right ? blanks + cell : cell + blanks;
    }

    private static int length(CharSequence cell) {
        return (int) cell.codePoints().count();
    }
}
