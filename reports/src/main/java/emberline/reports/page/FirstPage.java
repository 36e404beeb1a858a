package emberline.reports.page;

import emberline.catalogue.FeatureCatalogue;
import emberline.place.calibrated.Calibration;
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
    static final float TOP = 40;
    static final float FOOT = 44;

    private static final float LEAST_SPECTRUM = 168;
    private static final float MOST_SPECTRUM = 345;
    private static final float BETWEEN = 34;
    private static final float LIMITS_LEADING = 8.4f;
    private static final float BOX_PAD = 7;
    private static final Color BOX = new Color(0xF3F5F8);
    private static final Frame SPECTRUM_FRAME = new Frame(32, 4, 3, 24);

    private final ReportDocument document;
    private final FeatureCatalogue catalogue;
    private final Calibration calibration;
    private final Paper paper;
    private final Styles styles;
    private final float width;

    FirstPage(
            ReportDocument document,
            FeatureCatalogue catalogue,
            Calibration calibration,
            Paper paper) {
        this.document = document;
        this.catalogue = catalogue;
        this.calibration = calibration;
        this.paper = paper;
        this.styles = document.styles();
        this.width = paper.widthPoint() - 2 * MARGIN;
    }

    /**
     * Writes the page: the spectrum takes the room that the panels leave it. Returns whether there
     * was room for the gravity charts, which else go to the next page.
     */
    boolean write(Sheet sheet, ObjectResult result) throws IOException {
        float y = new PageHead(document, width).write(sheet, result);
        List<String> limits =
                document.lines().wrap(styles.small(), LimitsText.of(result), width - 2 * BOX_PAD);
        float limitsTall =
                styles.heading().leadingPoint() + limits.size() * LIMITS_LEADING + 2 * BOX_PAD - 3;
        float limitsTop = paper.heightPoint() - FOOT - 6 - limitsTall;
        TypePanel types = new TypePanel(document, catalogue, result, width);
        EvidencePanel evidence = new EvidencePanel(document, result, width);
        float gravityTall = GravityPanel.tall(result);
        float room = limitsTop - y - evidence.tall() - BETWEEN;
        boolean gravityHere =
                room - gravityTall - types.tall(TypePanel.FEWEST_ROWS) >= LEAST_SPECTRUM;
        room -= gravityHere ? gravityTall : 0;
        int rows = types.rows();
        while (rows > TypePanel.FEWEST_ROWS && room - types.tall(rows) < LEAST_SPECTRUM) {
            rows--;
        }
        float typesTall = types.tall(rows);
        float tall = Math.min(MOST_SPECTRUM, room - typesTall);
        typesTall += Math.max(0, Math.min(types.growth(rows), room - typesTall - tall));
        y = spectrum(sheet, result, y, tall) + 10;
        types.write(sheet, y, typesTall, rows);
        y += typesTall;
        if (gravityHere) {
            new GravityPanel(document, catalogue, calibration, width).write(sheet, result, y);
            y += gravityTall;
        }
        evidence.write(sheet, y);
        limits(sheet, limits, limitsTop, limitsTall);
        return gravityHere;
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
            sheet.text(styles.small().in(document.theme().ink()), MARGIN + BOX_PAD, at, line);
            at += LIMITS_LEADING;
        }
    }
}
