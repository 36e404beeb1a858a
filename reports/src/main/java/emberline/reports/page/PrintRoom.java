package emberline.reports.page;

import emberline.reports.paint.ChartPainter;
import emberline.reports.paint.Face;
import emberline.reports.paint.Theme;
import java.awt.Font;
import java.io.IOException;
import java.io.OutputStream;
import java.util.EnumMap;
import java.util.Map;
import org.apache.fontbox.ttf.TrueTypeFont;
import org.apache.pdfbox.pdmodel.PDDocument;

/**
 * What it takes to print documents of one style: fonts, theme, painter. Safe for use by several
 * threads; parsed fonts are kept for the next document.
 */
final class PrintRoom {

    private final FontShelf shelf = new FontShelf();
    private final Theme theme = Theme.print();
    private final Map<Face, Font> drawn = new EnumMap<>(Face.class);
    private final ChartPainter painter;

    PrintRoom() {
        drawn.put(Face.SANS, Face.SANS.awt());
        drawn.put(Face.SANS_BOLD, Face.SANS_BOLD.awt());
        this.painter = new ChartPainter(theme, drawn.get(Face.SANS), drawn.get(Face.SANS_BOLD));
    }

    /** Fills an empty document. */
    @FunctionalInterface
    interface Content {
        void write(ReportDocument document) throws IOException;
    }

    /** Makes a document and writes it to a stream, which stays open. */
    void print(Content content, OutputStream stream) throws IOException {
        Map<Face, TrueTypeFont> files = shelf.borrow();
        try (PDDocument pdf = new PDDocument()) {
            content.write(new ReportDocument(pdf, files, drawn, painter, theme));
            pdf.save(stream);
        } finally {
            shelf.giveBack(files);
        }
    }
}
