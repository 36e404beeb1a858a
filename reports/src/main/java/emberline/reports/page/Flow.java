package emberline.reports.page;

import java.io.Closeable;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;

/** Sets lines in columns: down a column, on to the next one, on to the next page. */
final class Flow implements Closeable {

    private static final int COLUMNS = 3;
    private static final float GUTTER = 15;
    private static final float BEFORE_HEADING = 7;

    /** A heading wants this much room below it in its column (point). */
    private static final float WITH_HEADING = 30;

    private final ReportDocument document;
    private final Paper paper;
    private final float columnWidth;
    private final List<Bookmark> bookmarks = new ArrayList<>();
    private final List<Sheet> sheets = new ArrayList<>();
    private int column = COLUMNS;
    private float y;

    Flow(ReportDocument document, Paper paper) {
        this.document = document;
        this.paper = paper;
        this.columnWidth =
                (paper.widthPoint() - 2 * FirstPage.MARGIN - (COLUMNS - 1) * GUTTER) / COLUMNS;
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

    float columnWidth() {
        return columnWidth;
    }

    List<Bookmark> bookmarks() {
        return bookmarks;
    }

    void heading(String text) throws IOException {
        Style style = document.styles().heading();
        boolean first = column == COLUMNS || y <= top() + 1;
        need(style.leadingPoint() + (first ? 0 : BEFORE_HEADING) + WITH_HEADING);
        if (y > top() + 1) {
            y += BEFORE_HEADING;
        }
        y += style.leadingPoint() - 2;
        sheet().text(style, left(), y, text);
        sheet().rule(left(), left() + columnWidth, y + 3, document.theme().rule(), 0.5f);
        y += 5;
        bookmarks.add(new Bookmark(text, sheet()));
    }

    void subheading(String text) throws IOException {
        Style style = document.styles().note();
        need(2.5f * style.leadingPoint());
        y += style.leadingPoint() + 1;
        sheet().text(style, left(), y, text);
    }

    void row(List<Cell> cells) throws IOException {
        float leading = cells.get(0).style().leadingPoint();
        need(leading);
        y += leading;
        for (Cell cell : cells) {
            String text = document.lines().fit(cell.style(), cell.text(), cell.width());
            if (cell.right()) {
                sheet().textRight(cell.style(), left() + cell.from(), y, text);
            } else {
                sheet().text(cell.style(), left() + cell.from(), y, text);
            }
        }
    }

    /** A paragraph whose lines after the first begin further right. */
    void paragraph(Style style, String text, float hanging) throws IOException {
        Lines lines = document.lines();
        List<String> first = lines.wrap(style, text, columnWidth);
        List<String> all = new ArrayList<>();
        all.add(first.get(0));
        if (first.size() > 1) {
            String rest = lines.wrap(style, text, Float.MAX_VALUE).get(0);
            String remaining = rest.substring(Math.min(rest.length(), first.get(0).length()));
            all.addAll(lines.wrap(style, remaining.stripLeading(), columnWidth - hanging));
        }
        need(Math.min(2, all.size()) * style.leadingPoint());
        for (int i = 0; i < all.size(); i++) {
            need(style.leadingPoint());
            y += style.leadingPoint();
            sheet().text(style, left() + (i == 0 ? 0 : hanging), y, all.get(i));
        }
    }

    /** A paragraph of which every line begins further right. */
    void indented(Style style, String text, float indent) throws IOException {
        for (String line : document.lines().wrap(style, text, columnWidth - indent)) {
            need(style.leadingPoint());
            y += style.leadingPoint();
            sheet().text(style, left() + indent, y, line);
        }
    }

    private Sheet sheet() {
        return sheets.get(sheets.size() - 1);
    }

    private float left() {
        return FirstPage.MARGIN + column * (columnWidth + GUTTER);
    }

    private static float top() {
        return FirstPage.TOP + 20;
    }

    private void need(float point) throws IOException {
        if (column < COLUMNS && y + point <= paper.heightPoint() - FirstPage.FOOT - 6) {
            return;
        }
        column++;
        if (column >= COLUMNS) {
            if (!sheets.isEmpty()) {
                sheet().close();
            }
            sheets.add(new Sheet(document, paper));
            column = 0;
            DetailPages.head(document, sheet(), paper, sheets.size());
        }
        y = top();
    }

    @Override
    public void close() throws IOException {
        if (!sheets.isEmpty()) {
            sheet().close();
        }
    }
}
