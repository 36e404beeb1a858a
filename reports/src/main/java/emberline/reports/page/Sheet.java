package emberline.reports.page;

import de.rototor.pdfbox.graphics2d.PdfBoxGraphics2D;
import emberline.reports.chart.Chart;
import emberline.reports.paint.Frame;
import java.awt.Color;
import java.io.Closeable;
import java.io.IOException;
import org.apache.pdfbox.pdmodel.PDPage;
import org.apache.pdfbox.pdmodel.PDPageContentStream;
import org.apache.pdfbox.pdmodel.common.PDRectangle;
import org.apache.pdfbox.util.Matrix;

/** One page to write on. Places are in points from the upper left corner. */
final class Sheet implements Closeable {

    private final ReportDocument document;
    private final PDPage page;
    private final PDPageContentStream content;
    private final float height;

    Sheet(ReportDocument document, Paper paper) throws IOException {
        this.document = document;
        this.height = paper.heightPoint();
        this.page = new PDPage(new PDRectangle(paper.widthPoint(), paper.heightPoint()));
        document.pdf().addPage(page);
        this.content = new PDPageContentStream(document.pdf(), page);
    }

    PDPage page() {
        return page;
    }

    /** Writes a line with its start at a place on its baseline. */
    void text(Style style, float x, float baseline, String text) throws IOException {
        String clean = document.fonts().clean(style.face(), text);
        if (clean.isBlank()) {
            return;
        }
        content.beginText();
        content.setNonStrokingColor(style.colour());
        content.setFont(document.fonts().font(style.face()), style.sizePoint());
        content.newLineAtOffset(x, height - baseline);
        content.showText(clean);
        content.endText();
    }

    /** Writes a line with its end at a place on its baseline. */
    void textRight(Style style, float right, float baseline, String text) throws IOException {
        text(style, right - document.lines().width(style, text), baseline, text);
    }

    void rule(float left, float right, float y, Color colour, float width) throws IOException {
        content.setStrokingColor(colour);
        content.setLineWidth(width);
        content.moveTo(left, height - y);
        content.lineTo(right, height - y);
        content.stroke();
    }

    void box(float left, float top, float width, float tall, Color colour) throws IOException {
        content.setNonStrokingColor(colour);
        content.addRect(left, height - top - tall, width, tall);
        content.fill();
    }

    /** Draws a chart with its upper left corner at a place. */
    void chart(Chart chart, float left, float top, float width, float tall, Frame frame)
            throws IOException {
        PdfBoxGraphics2D graphics = new PdfBoxGraphics2D(document.pdf(), width, tall);
        try {
            graphics.setFontTextDrawer(document.textDrawer());
            document.painter().paint(chart, graphics, width, tall, frame);
        } finally {
            graphics.dispose();
        }
        content.saveGraphicsState();
        content.transform(Matrix.getTranslateInstance(left, height - top - tall));
        content.drawForm(graphics.getXFormObject());
        content.restoreGraphicsState();
    }

    @Override
    public void close() throws IOException {
        content.close();
    }
}
