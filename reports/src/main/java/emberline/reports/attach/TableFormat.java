package emberline.reports.attach;

/** How a table is printed. */
public enum TableFormat {
    /** Aligned columns for a terminal. */
    TEXT,
    /** Comma-separated values with a header. */
    CSV,
    /** An object, or an array of objects where there are several. */
    JSON
}
