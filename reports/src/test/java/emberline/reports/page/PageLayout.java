package emberline.reports.page;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assertions.fail;

import emberline.reports.page.PdfText.Box;
import java.awt.geom.Rectangle2D;
import java.io.IOException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;

/** Whether the signs of a page stand on it and apart from each other. */
final class PageLayout {

    /** Side of the cells of a grid in which neighbours are looked for (point). */
    private static final double CELL = 20;

    private PageLayout() {}

    /** Fails where there are not two pages, or a sign leaves its page or touches another. */
    static void assertTwoPagesWellSet(byte[] pdf, Paper paper) throws IOException {
        try (PDDocument document = Loader.loadPDF(pdf)) {
            assertEquals(2, document.getNumberOfPages(), "pages");
        }
        assertWellSet(pdf, paper);
    }

    /** Fails where a sign leaves its page or touches another. */
    static void assertWellSet(byte[] pdf, Paper paper) throws IOException {
        Rectangle2D page =
                new Rectangle2D.Double(30, 24, paper.widthPoint() - 60, paper.heightPoint() - 54);
        List<Box> boxes = PdfText.boxes(pdf);
        assertTrue(boxes.size() > 500, "only " + boxes.size() + " signs");
        Map<List<Integer>, List<Box>> seen = new HashMap<>();
        for (Box box : boxes) {
            assertTrue(page.contains(box.place()), box + " leaves the page");
            Rectangle2D place = shrunk(box.place());
            for (List<Integer> cell : cells(box.page(), place)) {
                List<Box> others = seen.computeIfAbsent(cell, c -> new ArrayList<>());
                for (Box other : others) {
                    if (place.intersects(shrunk(other.place()))) {
                        fail(box + " overlaps " + other);
                    }
                }
                others.add(box);
            }
        }
    }

    /** The cells of a grid that a sign touches: only signs of one cell can touch each other. */
    private static List<List<Integer>> cells(int page, Rectangle2D place) {
        List<List<Integer>> cells = new ArrayList<>();
        for (int x = (int) (place.getMinX() / CELL); x <= (int) (place.getMaxX() / CELL); x++) {
            for (int y = (int) (place.getMinY() / CELL); y <= (int) (place.getMaxY() / CELL); y++) {
                cells.add(List.of(page, x, y));
            }
        }
        return cells;
    }

    private static Rectangle2D shrunk(Rectangle2D box) {
        double by = 0.2;
        return new Rectangle2D.Double(
                box.getX() + by,
                box.getY() + by,
                box.getWidth() - 2 * by,
                box.getHeight() - 2 * by);
    }
}
