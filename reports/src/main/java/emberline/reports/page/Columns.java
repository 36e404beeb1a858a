package emberline.reports.page;

import emberline.reports.page.Line.Cell;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;

/**
 * Sets lines in the columns of one page: down a column and on to the next one; the columns are of
 * about equal length.
 */
final class Columns {

    /** How close lines may be set, the loosest first. */
    static final List<Float> TIGHTNESS = List.of(1f, 0.97f, 0.94f, 0.91f, 0.89f);

    private static final int COLUMNS = 3;
    private static final float GUTTER = 13;
    private static final float BALANCE_STEP = 4;

    private final ReportDocument document;
    private final float columnWidth;
    private final float top;
    private final float room;

    /**
     * The columns of a page.
     *
     * @param document where they are written
     * @param paper its paper
     * @param top where they begin (point from the upper edge)
     */
    Columns(ReportDocument document, Paper paper, float top) {
        this.document = document;
        this.columnWidth =
                (paper.widthPoint() - 2 * FirstPage.MARGIN - (COLUMNS - 1) * GUTTER) / COLUMNS;
        this.top = top;
        this.room = paper.heightPoint() - FirstPage.FOOT - 6 - top;
    }

    /** Where a section begins. */
    record Bookmark(String title, Sheet sheet) {}

    float columnWidth() {
        return columnWidth;
    }

    /** Whether lines find room when set so closely. */
    boolean hold(List<Line> lines, float tightness) {
        return starts(lines, tightness, room)[COLUMNS] == lines.size();
    }

    /** How many of the lines find room when set so closely. */
    int held(List<Line> lines, float tightness) {
        return starts(lines, tightness, room)[COLUMNS];
    }

    /** Draws lines that find room; returns where the sections begin. */
    List<Bookmark> draw(Sheet sheet, List<Line> lines, float tightness) throws IOException {
        List<Bookmark> bookmarks = new ArrayList<>();
        int[] starts = balanced(lines, tightness);
        for (int column = 0; column < COLUMNS; column++) {
            draw(
                    sheet,
                    column,
                    lines.subList(starts[column], starts[column + 1]),
                    tightness,
                    bookmarks);
        }
        return bookmarks;
    }

    private int[] balanced(List<Line> lines, float tightness) {
        float sum = 0;
        for (Line line : lines) {
            sum += line.tall(false, tightness);
        }
        for (float tall = sum / COLUMNS; tall < room; tall += BALANCE_STEP) {
            int[] starts = starts(lines, tightness, tall);
            if (starts[COLUMNS] == lines.size()) {
                return starts;
            }
        }
        return starts(lines, tightness, room);
    }

    /** The first line of each column of a height, and the first that finds no room. */
    private static int[] starts(List<Line> lines, float tightness, float tall) {
        int[] starts = new int[COLUMNS + 1];
        int next = 0;
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
            next = keptTogether(lines, start, next);
        }
        starts[COLUMNS] = next;
        return starts;
    }

    /** Moves the end of a column up where a line must not be parted from those after it. */
    private static int keptTogether(List<Line> lines, int start, int end) {
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

    private void draw(
            Sheet sheet, int column, List<Line> lines, float tightness, List<Bookmark> bookmarks)
            throws IOException {
        float left = FirstPage.MARGIN + column * (columnWidth + GUTTER);
        float y = top;
        boolean first = true;
        for (Line line : lines) {
            y += (first ? 0 : line.before()) + line.leading() * tightness;
            first = false;
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
}
