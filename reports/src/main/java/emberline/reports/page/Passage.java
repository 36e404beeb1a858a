package emberline.reports.page;

import emberline.reports.page.Line.Cell;
import java.util.ArrayList;
import java.util.List;

/** Breaks what a section says into the lines of a column. */
final class Passage {

    private static final float BEFORE_HEADING = 7;
    private static final float HANGING = 8;

    private final ReportDocument document;
    private final float width;
    private final int mostLines;
    private final List<Line> lines = new ArrayList<>();

    /**
     * An empty passage.
     *
     * @param document where it is written
     * @param width width of the column (point)
     * @param mostLines the most lines of a paragraph; an ellipsis ends a longer one
     */
    Passage(ReportDocument document, float width, int mostLines) {
        this.document = document;
        this.width = width;
        this.mostLines = mostLines;
    }

    /** The lines so far. */
    List<Line> lines() {
        return lines;
    }

    float width() {
        return width;
    }

    void heading(String text) {
        Style style = document.styles().heading();
        Cell cell = new Cell(style, text, 0, width, false);
        lines.add(new Line(List.of(cell), BEFORE_HEADING, style.leadingPoint() - 2, 5, 3, true));
    }

    void subheading(String text) {
        Style style = document.styles().note();
        Cell cell = new Cell(style, text, 0, width, false);
        lines.add(new Line(List.of(cell), 1, style.leadingPoint(), 0, 1, false));
    }

    void row(List<Cell> cells) {
        lines.add(new Line(cells, 0, cells.get(0).style().leadingPoint(), 0, 0, false));
    }

    /** A remark on the section. */
    void note(String text) {
        set(document.styles().note(), text, 0, Integer.MAX_VALUE);
    }

    /** A paragraph in the style of tables whose lines after the first begin further right. */
    void item(String text) {
        set(document.styles().table(), text, HANGING, mostLines);
    }

    /** A paragraph whose lines after the first begin further right. */
    void item(Style style, String text) {
        set(style, text, HANGING, mostLines);
    }

    /** A paragraph whose lines all begin at the left and of which nothing is left out. */
    void paragraph(String text) {
        set(document.styles().table(), text, 0, Integer.MAX_VALUE);
    }

    /** An item of which nothing is left out. */
    void whole(String text) {
        set(document.styles().table(), text, HANGING, Integer.MAX_VALUE);
    }

    private void set(Style style, String text, float hanging, int most) {
        Lines breaker = document.lines();
        List<String> wrapped = breaker.wrap(style, text, width);
        if (wrapped.size() > 1 && hanging > 0) {
            String whole = breaker.wrap(style, text, Float.MAX_VALUE).get(0);
            String rest = whole.substring(wrapped.get(0).length()).stripLeading();
            List<String> hung = new ArrayList<>(wrapped.subList(0, 1));
            hung.addAll(breaker.wrap(style, rest, width - hanging, Math.max(1, most - 1)));
            wrapped = hung;
        } else if (wrapped.size() > most) {
            wrapped = breaker.wrap(style, text, width, most);
        }
        for (int i = 0; i < wrapped.size(); i++) {
            float from = i == 0 ? 0 : hanging;
            Cell cell = new Cell(style, wrapped.get(i), from, width - from, false);
            boolean kept = (i == 0 && wrapped.size() > 1) || style.equals(document.styles().note());
            int keep = kept ? 1 : 0;
            lines.add(new Line(List.of(cell), 0, style.leadingPoint(), 0, keep, false));
        }
    }
}
