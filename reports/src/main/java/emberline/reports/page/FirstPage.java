package emberline.reports.page;

import emberline.catalogue.FeatureCatalogue;
import emberline.reports.chart.ChartSize;
import emberline.reports.chart.SpectrumChart;
import emberline.reports.paint.Frame;
import emberline.survey.ObjectResult;
import java.awt.Color;
import java.io.IOException;
import java.util.List;

/** The first page: what the object is, how sure that is, and why. */
final class FirstPage {

    static final float MARGIN = 45;
    static final float TOP = 44;
    static final float FOOT = 46;

    private static final float LEAST_SPECTRUM = 150;
    private static final float MOST_SPECTRUM = 345;
    private static final float BETWEEN = 30;
    private static final float BOX_PAD = 7;
    private static final Color BOX = new Color(0xF3F5F8);
    private static final Frame SPECTRUM_FRAME = new Frame(32, 4, 3, 24);

    private final ReportDocument document;
    private final FeatureCatalogue catalogue;
    private final Paper paper;
    private final Styles styles;
    private final float width;

    FirstPage(ReportDocument document, FeatureCatalogue catalogue, Paper paper) {
        this.document = document;
        this.catalogue = catalogue;
        this.paper = paper;
        this.styles = document.styles();
        this.width = paper.widthPoint() - 2 * MARGIN;
    }

    /** Writes the page: the spectrum takes the room that the panels leave it. */
    void write(Sheet sheet, ObjectResult result) throws IOException {
        float y = new PageHead(document, width).write(sheet, result);
        List<String> limits =
                document.lines().wrap(styles.body(), LimitsText.of(result), width - 2 * BOX_PAD);
        float limitsTall =
                styles.heading().leadingPoint()
                        + limits.size() * styles.body().leadingPoint()
                        + 2 * BOX_PAD
                        - 2;
        float limitsTop = paper.heightPoint() - FOOT - 8 - limitsTall;
        TypePanel types = new TypePanel(document, catalogue, result, width);
        float room = limitsTop - y - GravityPanel.tall(result) - BETWEEN;
        int rows = types.rows();
        while (rows > TypePanel.FEWEST_ROWS && room - types.tall(rows) < LEAST_SPECTRUM) {
            rows--;
        }
        float typesTall = types.tall(rows);
        float tall = Math.min(MOST_SPECTRUM, room - typesTall);
        typesTall += Math.max(0, Math.min(TypePanel.growth(rows), room - typesTall - tall));
        y = spectrum(sheet, result, y, tall) + 12;
        types.write(sheet, y, typesTall, rows);
        new GravityPanel(document, catalogue, width).write(sheet, result, y + typesTall);
        limits(sheet, limits, limitsTop, limitsTall);
    }

    private float spectrum(Sheet sheet, ObjectResult result, float y, float tall)
            throws IOException {
        ChartSize size =
                new ChartSize(
                        width - SPECTRUM_FRAME.left() - SPECTRUM_FRAME.right(),
                        tall - SPECTRUM_FRAME.top() - SPECTRUM_FRAME.bottom(),
                        document.theme().labelSizePoint());
        SpectrumChart.Drawn drawn =
                new SpectrumChart(catalogue, size, document.labelWidth()).of(result);
        sheet.chart(drawn.chart(), MARGIN, y, width, tall, SPECTRUM_FRAME);
        String caption =
                (drawn.remark().isEmpty() ? "" : drawn.remark() + " ")
                        + "Shaded: one sigma. Strip at the bottom: telluric absorption, the darker"
                        + " the stronger; pale to the top where opaque. Hatched: no data. Labels"
                        + " mark where bands and lines lie, not that they were detected.";
        float at = y + tall + 7;
        for (String line : document.lines().wrap(styles.small(), caption, width)) {
            sheet.text(styles.small(), MARGIN, at, line);
            at += styles.small().leadingPoint();
        }
        return at - styles.small().leadingPoint() + 3;
    }

    private void limits(Sheet sheet, List<String> lines, float top, float tall) throws IOException {
        sheet.box(MARGIN, top, width, tall, BOX);
        float at = top + BOX_PAD + 6.5f;
        sheet.text(styles.heading(), MARGIN + BOX_PAD, at, "What this cannot tell");
        at += styles.heading().leadingPoint();
        for (String line : lines) {
            sheet.text(styles.body(), MARGIN + BOX_PAD, at, line);
            at += styles.body().leadingPoint();
        }
    }
}
