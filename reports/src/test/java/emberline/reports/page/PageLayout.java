package emberline.reports.page;

import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assertions.fail;

import emberline.reports.page.PdfText.Box;
import java.awt.geom.Rectangle2D;
import java.io.IOException;
import java.util.List;

/** Whether the signs of a page stand on it and apart from each other. */
final class PageLayout {

    private PageLayout() {}

    /** Fails where a sign leaves its page or touches another. */
    static void assertWellSet(byte[] pdf, Paper paper) throws IOException {
        Rectangle2D page =
                new Rectangle2D.Double(30, 24, paper.widthPoint() - 60, paper.heightPoint() - 54);
        List<Box> boxes = PdfText.boxes(pdf);
        assertTrue(boxes.size() > 500, "only " + boxes.size() + " signs");
        List<Rectangle2D> places = boxes.stream().map(box -> shrunk(box.place())).toList();
        for (int i = 0; i < boxes.size(); i++) {
            Box box = boxes.get(i);
            assertTrue(page.contains(box.place()), box + " leaves the page");
            for (int j = 0; j < i; j++) {
                Box other = boxes.get(j);
                if (box.page() == other.page() && places.get(i).intersects(places.get(j))) {
                    fail(box + " overlaps " + other);
                }
            }
        }
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
