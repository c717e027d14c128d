package org.levelgaze.agreement;

/**
 * Cohen's kappa of a square table with any number of categories, and its two standard errors. Margins and agreements are
 * whole numbers as long as possible, so that a chance agreement of 1 is recognised exactly.
 *
 * <p>Cohen 1960; Fleiss, Cohen &amp; Everitt, Psychol. Bull. 72 (1969) 323-327, formulas (8) and (9) for equal weights.
 */
final class KappaMoments {

    private final long[][] table;
    private final long[] rows;
    private final long[] columns;
    private final long n;
    private final long agreed;
    private final double agreedByChance;
    private final boolean chanceIsOne;

    private KappaMoments(long[][] table) {
        this.table = table;
        rows = new long[table.length];
        columns = new long[table.length];
        long all = 0;
        long diagonal = 0;
        for (int row = 0; row < table.length; row++) {
            diagonal += table[row][row];
            for (int column = 0; column < table.length; column++) {
                rows[row] += table[row][column];
                columns[column] += table[row][column];
                all += table[row][column];
            }
        }
        n = all;
        agreed = diagonal;
        long products = 0;
        for (int at = 0; at < rows.length; at++) {
            products += rows[at] * columns[at];
        }
        agreedByChance = (double) products / n;
        chanceIsOne = products == n * n;
    }

    /** Rows are the one judge's categories, columns the other's; at least one call. */
    static KappaMoments of(long[][] table) {
        return new KappaMoments(table);
    }

    boolean chanceIsOne() {
        return chanceIsOne;
    }

    double observed() {
        return (double) agreed / n;
    }

    double expected() {
        return agreedByChance / n;
    }

    double kappa() {
        return (agreed - agreedByChance) / (n - agreedByChance);
    }

    /** Not under the hypothesis kappa = 0: the one for intervals. */
    double standardError() {
        double kappa = kappa();
        double sum = 0;
        for (int row = 0; row < rows.length; row++) {
            for (int column = 0; column < rows.length; column++) {
                double both = columns[row] + rows[column];
                double factor = row == column ? n - both * (1 - kappa) : both * (1 - kappa);
                sum += table[row][column] * factor * factor / n / n;
            }
        }
        double offset = kappa * n - agreedByChance * (1 - kappa);
        double variance = (sum - offset * offset / n) / square(n - agreedByChance);
        return Math.sqrt(Math.max(0, variance));
    }

    /** Under the hypothesis kappa = 0: for its test alone. */
    double standardErrorUnderNull() {
        double expected = expected();
        double sum = expected + expected * expected;
        for (int at = 0; at < rows.length; at++) {
            sum -= (double) rows[at] / n * columns[at] / n * (rows[at] + columns[at]) / n;
        }
        return Math.sqrt(Math.max(0, sum) / n) / (1 - expected);
    }

    private static double square(double value) {
        return value * value;
    }
}
