package org.levelgaze.studies.reading;

/** How much one file may hold. What is larger is refused by name before it is kept. */
public final class Limits {

    /** Bytes of a file: 512 MiB. Compressed files are not taken at all, so nothing unpacks to more. */
    public static final long BYTES = 512L << 20;

    /** Rows below the header. */
    public static final int ROWS = 5_000_000;

    /** Calls, which are more than the rows when a row holds several. */
    public static final int CALLS = 5_000_000;

    /** Columns. */
    public static final int COLUMNS = 1_000;

    /** Characters of one cell. */
    public static final int CELL = 1_000;

    /** Characters of one row; a quote left open ends here instead of filling the memory. */
    public static final int ROW = 2_000_000;

    /** Pieces. */
    public static final int PIECES = 1_000_000;

    /** Appraisers. */
    public static final int APPRAISERS = 500;

    /** Different defect kinds. */
    public static final int KINDS = 1_000;

    /** The highest trial number. */
    public static final int TRIAL = 1_000_000;

    private Limits() {}
}
