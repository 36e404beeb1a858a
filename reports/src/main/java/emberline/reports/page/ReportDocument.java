package emberline.reports.page;

import de.rototor.pdfbox.graphics2d.PdfBoxGraphics2DFontTextDrawer;
import emberline.reports.chart.Axis;
import emberline.reports.chart.Chart;
import emberline.reports.chart.TextWidth;
import emberline.reports.paint.ChartPainter;
import emberline.reports.paint.Face;
import emberline.reports.paint.Frame;
import emberline.reports.paint.Theme;
import java.awt.Font;
import java.io.IOException;
import java.util.Map;
import org.apache.fontbox.ttf.TrueTypeFont;
import org.apache.pdfbox.pdmodel.PDDocument;

/** What all pages of one document share. */
final class ReportDocument {

    private static final double ROOM_OF_LABEL = 7;

    private final PDDocument pdf;
    private final FontSet fonts;
    private final Lines lines;
    private final ChartPainter painter;
    private final PdfBoxGraphics2DFontTextDrawer textDrawer;
    private final Theme theme;
    private final Styles styles;

    ReportDocument(
            PDDocument pdf,
            Map<Face, TrueTypeFont> files,
            Map<Face, Font> drawn,
            ChartPainter painter,
            Theme theme)
            throws IOException {
        this.pdf = pdf;
        this.fonts = new FontSet(pdf, files);
        this.lines = new Lines(fonts);
        this.painter = painter;
        this.textDrawer = fonts.textDrawer(drawn);
        this.theme = theme;
        this.styles = Styles.of(theme);
    }

    PDDocument pdf() {
        return pdf;
    }

    FontSet fonts() {
        return fonts;
    }

    Lines lines() {
        return lines;
    }

    ChartPainter painter() {
        return painter;
    }

    PdfBoxGraphics2DFontTextDrawer textDrawer() {
        return textDrawer;
    }

    Theme theme() {
        return theme;
    }

    Styles styles() {
        return styles;
    }

    /** How wide the labels of charts are. */
    TextWidth labelWidth() {
        return (text, size) -> fonts.width(Face.SANS, fonts.clean(Face.SANS, text), (float) size);
    }

    /**
     * A frame whose left side has room for the labels of the rows of a chart, up to a limit
     * (point).
     */
    Frame frameFor(Chart chart, Frame frame, float most) {
        double widest = 0;
        for (Axis.Tick tick : chart.y().ticks()) {
            widest = Math.max(widest, labelWidth().point(tick.label(), theme.labelSizePoint()));
        }
        return new Frame(
                Math.min(most, widest + ROOM_OF_LABEL), frame.top(), frame.right(), frame.bottom());
    }
}
