package emberline.reports.page;

import java.util.List;

/**
 * A line of a column.
 *
 * @param cells its pieces
 * @param before room above it, dropped at the top of a column (point)
 * @param leading distance from the line above (point)
 * @param after room below it (point)
 * @param keep how many of the following lines stay in the same column
 * @param heading whether it begins a section and has a rule below
 */
record Line(List<Cell> cells, float before, float leading, float after, int keep, boolean heading) {

    Line {
        cells = List.copyOf(cells);
    }

    /**
     * A piece of a line.
     *
     * @param style how it is set
     * @param text what it says
     * @param from its left end, or with {@code right} its right end (point from the column)
     * @param width the room it has (point)
     * @param right whether it ends at {@code from}
     */
    record Cell(Style style, String text, float from, float width, boolean right) {}

    /** Its height at the top of a column or below another line, set more or less closely. */
    float tall(boolean first, float tightness) {
        return (first ? 0 : before) + leading * tightness + after;
    }
}
