package emberline.reports.page;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;

/**
 * Sets lines in columns: down a column, on to the next one, on to the next page; the columns of the
 * last page are of about equal length. Lines are collected first and drawn at the end.
 */
final class Flow {

    private static final int COLUMNS = 3;
    private static final float GUTTER = 15;
    private static final float BEFORE_HEADING = 7;
    private static final float BALANCE_STEP = 4;
    private static final float[] TIGHTNESS = {1, 0.97f, 0.94f, 0.91f, 0.88f};

    private final ReportDocument document;
    private final Paper paper;
    private final float columnWidth;
    private final List<Line> lines = new ArrayList<>();
    private float tightness = 1;
    private Band band = new Band(0, (sheet, top) -> {});

    Flow(ReportDocument document, Paper paper) {
        this.document = document;
        this.paper = paper;
        this.columnWidth =
                (paper.widthPoint() - 2 * FirstPage.MARGIN - (COLUMNS - 1) * GUTTER) / COLUMNS;
    }

    /** Writes a band from its top down. */
    @FunctionalInterface
    interface BandContent {
        void write(Sheet sheet, float top) throws IOException;
    }

    /** What stands above the columns of the first page over their full width. */
    private record Band(float tall, BandContent content) {}

    /** Puts a band of a height (point) above the columns of the first page. */
    void band(float tall, BandContent content) {
        band = new Band(tall, content);
    }

    /** Where a section begins. */
    record Bookmark(String title, Sheet sheet) {}

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
    private record Line(
            List<Cell> cells, float before, float leading, float after, int keep, boolean heading) {

        float tall(boolean first, float tightness) {
            return (first ? 0 : before) + leading * tightness + after;
        }
    }

    float columnWidth() {
        return columnWidth;
    }

    void heading(String text) {
        Style style = document.styles().heading();
        Cell cell = new Cell(style, text, 0, columnWidth, false);
        lines.add(new Line(List.of(cell), BEFORE_HEADING, style.leadingPoint() - 2, 5, 3, true));
    }

    void subheading(String text) {
        Style style = document.styles().note();
        Cell cell = new Cell(style, text, 0, columnWidth, false);
        lines.add(new Line(List.of(cell), 1, style.leadingPoint(), 0, 1, false));
    }

    void row(List<Cell> cells) {
        lines.add(
                new Line(List.copyOf(cells), 0, cells.get(0).style().leadingPoint(), 0, 0, false));
    }

    /** A paragraph whose lines after the first begin further right. */
    void paragraph(Style style, String text, float hanging) {
        Lines breaker = document.lines();
        List<String> wrapped = breaker.wrap(style, text, columnWidth);
        if (wrapped.size() > 1 && hanging > 0) {
            String whole = breaker.wrap(style, text, Float.MAX_VALUE).get(0);
            String rest = whole.substring(wrapped.get(0).length()).stripLeading();
            List<String> hung = new ArrayList<>(wrapped.subList(0, 1));
            hung.addAll(breaker.wrap(style, rest, columnWidth - hanging));
            wrapped = hung;
        }
        for (int i = 0; i < wrapped.size(); i++) {
            add(style, wrapped.get(i), i == 0 ? 0 : hanging, i == 0 && wrapped.size() > 1);
        }
    }

    /** A paragraph of which every line begins further right. */
    void indented(Style style, String text, float indent) {
        for (String line : document.lines().wrap(style, text, columnWidth - indent)) {
            add(style, line, indent, false);
        }
    }

    private void add(Style style, String text, float from, boolean keep) {
        Cell cell = new Cell(style, text, from, columnWidth - from, false);
        lines.add(new Line(List.of(cell), 0, style.leadingPoint(), 0, keep ? 1 : 0, false));
    }

    /** Draws all lines on as many pages as they need; returns where the sections begin. */
    List<Bookmark> draw() throws IOException {
        List<Bookmark> bookmarks = new ArrayList<>();
        tighten();
        int from = 0;
        int page = 0;
        while (from < lines.size()) {
            float top = top() + (page == 0 ? band.tall() : 0);
            float full = paper.heightPoint() - FirstPage.FOOT - 6 - top;
            int[] starts = columns(from, full);
            if (starts[COLUMNS] == lines.size()) {
                starts = balanced(from, full);
            }
            page++;
            try (Sheet sheet = new Sheet(document, paper)) {
                DetailPages.head(document, sheet, paper, page);
                if (page == 1) {
                    band.content().write(sheet, top());
                }
                for (int column = 0; column < COLUMNS; column++) {
                    draw(
                            sheet,
                            new Place(column, top),
                            starts[column],
                            starts[column + 1],
                            bookmarks);
                }
            }
            from = starts[COLUMNS];
        }
        return bookmarks;
    }

    /** Sets lines closer where that saves a page for a few lines. */
    private void tighten() {
        float room = paper.heightPoint() - FirstPage.FOOT - 6 - top() - band.tall();
        for (float tried : TIGHTNESS) {
            tightness = tried;
            if (columns(0, room)[COLUMNS] == lines.size()) {
                return;
            }
        }
        tightness = 1;
    }

    private int[] balanced(int from, float full) {
        float sum = 0;
        for (Line line : lines.subList(from, lines.size())) {
            sum += line.tall(false, tightness);
        }
        for (float tall = sum / COLUMNS; tall < full; tall += BALANCE_STEP) {
            int[] starts = columns(from, tall);
            if (starts[COLUMNS] == lines.size()) {
                return starts;
            }
        }
        return columns(from, full);
    }

    /** The first line of each column of a page, and the first that finds no room. */
    private int[] columns(int from, float tall) {
        int[] starts = new int[COLUMNS + 1];
        int next = from;
        for (int column = 0; column < COLUMNS; column++) {
            starts[column] = next;
            float y = 0;
            int start = next;
            while (next < lines.size()) {
                y += lines.get(next).tall(next == start, tightness);
                if (y > tall && next > start) {
                    break;
                }
                next++;
            }
            next = keptTogether(start, next);
        }
        starts[COLUMNS] = next;
        return starts;
    }

    /** Moves the end of a column up where a line must not be parted from those after it. */
    private int keptTogether(int start, int end) {
        if (end == lines.size()) {
            return end;
        }
        for (int i = Math.max(start + 1, end - 4); i < end; i++) {
            if (i + lines.get(i).keep() >= end) {
                return i;
            }
        }
        return end;
    }

    /** A column and where it begins. */
    private record Place(int column, float top) {}

    private void draw(Sheet sheet, Place place, int from, int to, List<Bookmark> bookmarks)
            throws IOException {
        float left = FirstPage.MARGIN + place.column() * (columnWidth + GUTTER);
        float y = place.top();
        for (int i = from; i < to; i++) {
            Line line = lines.get(i);
            y += (i == from ? 0 : line.before()) + line.leading() * tightness;
            for (Cell cell : line.cells()) {
                String text = document.lines().fit(cell.style(), cell.text(), cell.width());
                if (cell.right()) {
                    sheet.textRight(cell.style(), left + cell.from(), y, text);
                } else {
                    sheet.text(cell.style(), left + cell.from(), y, text);
                }
            }
            if (line.heading()) {
                sheet.rule(left, left + columnWidth, y + 3, document.theme().rule(), 0.5f);
                bookmarks.add(new Bookmark(line.cells().get(0).text(), sheet));
            }
            y += line.after();
        }
    }

    private static float top() {
        return FirstPage.TOP + 20;
    }
}
