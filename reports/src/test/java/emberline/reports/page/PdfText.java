package emberline.reports.page;

import java.awt.geom.Rectangle2D;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.text.PDFTextStripper;
import org.apache.pdfbox.text.TextPosition;
import org.apache.pdfbox.util.Matrix;

/** The texts of a PDF with their places, as a reader program finds them. */
final class PdfText {

    /** Height of capitals and depth of descenders in units of the font size. */
    private static final double ABOVE = 0.73;

    private static final double BELOW = 0.18;

    private PdfText() {}

    /** A sign on a page. */
    record Box(int page, String text, Rectangle2D place) {}

    /** All text in the order of the file. */
    static String all(byte[] pdf) throws IOException {
        try (PDDocument document = Loader.loadPDF(pdf)) {
            return new PDFTextStripper().getText(document);
        }
    }

    /** Every sign with the rectangle it takes up (point from the lower left corner). */
    static List<Box> boxes(byte[] pdf) throws IOException {
        try (PDDocument document = Loader.loadPDF(pdf)) {
            Collector collector = new Collector();
            collector.getText(document);
            return collector.boxes;
        }
    }

    private static final class Collector extends PDFTextStripper {

        private final List<Box> boxes = new ArrayList<>();

        Collector() throws IOException {
            setSuppressDuplicateOverlappingText(false);
        }

        @Override
        protected void processTextPosition(TextPosition position) {
            super.processTextPosition(position);
            if (!position.getUnicode().isBlank()) {
                boxes.add(new Box(getCurrentPageNo(), position.getUnicode(), place(position)));
            }
        }

        private static Rectangle2D place(TextPosition position) {
            Matrix matrix = position.getTextMatrix();
            double x = matrix.getTranslateX();
            double y = matrix.getTranslateY();
            double size = position.getFontSizeInPt();
            double width = position.getWidthDirAdj();
            if (position.getDir() == 90) {
                return new Rectangle2D.Double(x - ABOVE * size, y, (ABOVE + BELOW) * size, width);
            }
            return new Rectangle2D.Double(x, y - BELOW * size, width, (ABOVE + BELOW) * size);
        }
    }
}
