package emberline.reports.page;

import emberline.catalogue.FeatureCatalogue;
import emberline.place.Placement;
import emberline.reports.chart.Chart;
import emberline.reports.chart.PosteriorChart;
import emberline.reports.paint.Frame;
import emberline.survey.ObjectResult;
import java.io.IOException;
import java.util.List;
import java.util.Locale;

/** The middle of the first page: the chart of the type and beside it the key numbers. */
final class TypePanel {

    /** Fewest rows of relations for which there is room in any case. */
    static final int FEWEST_ROWS = 4;

    private static final int MOST_ROWS = 17;
    private static final float ROW = 9.2f;
    private static final float MOST_ROW = 15;
    private static final float KEY_WIDTH = 176;
    private static final float LABEL_WIDTH = 68;
    private static final float GUTTER = 18;
    private static final String HEADING = "Type: posterior and published relations";
    private static final Frame FRAME = new Frame(122, 2, 5, 24);

    private final ReportDocument document;
    private final FeatureCatalogue catalogue;
    private final ObjectResult result;
    private final List<KeyNumbers.Entry> keys;
    private final Styles styles;
    private final float width;

    TypePanel(
            ReportDocument document, FeatureCatalogue catalogue, ObjectResult result, float width) {
        this.document = document;
        this.catalogue = catalogue;
        this.result = result;
        this.keys = KeyNumbers.of(result);
        this.styles = document.styles();
        this.width = width;
    }

    /** How many rows of relations there are to show, at least {@link #FEWEST_ROWS}. */
    int rows() {
        long rows =
                result.placement().orElseThrow().published().estimates().stream()
                        .filter(e -> e.type().isPresent())
                        .count();
        return (int) Math.max(FEWEST_ROWS, Math.min(MOST_ROWS, rows));
    }

    /** The height that the panel takes up with so many rows (point). */
    float tall(int rows) {
        float chart = (rows + 4.6f) * ROW + (float) (FRAME.top() + FRAME.bottom());
        float lines = 0;
        for (KeyNumbers.Entry entry : keys) {
            lines += valueLines(entry).size() * styles.table().leadingPoint() + 1.6f;
        }
        return 14 + Math.max(chart, lines) + 8;
    }

    /** By how much the panel may grow where there is room (point). */
    static float growth(int rows) {
        return rows * (MOST_ROW - ROW);
    }

    void write(Sheet sheet, float y, float tall, int rows) throws IOException {
        float chartWidth = width - KEY_WIDTH - GUTTER;
        relations(sheet, y, tall, rows, chartWidth);
        keys(sheet, FirstPage.MARGIN + chartWidth + GUTTER, y);
    }

    private void relations(Sheet sheet, float y, float tall, int rows, float chartWidth)
            throws IOException {
        Placement placement = result.placement().orElseThrow();
        boolean any =
                placement.calibrated().posterior().isPresent()
                        || placement.published().estimates().stream()
                                .anyMatch(e -> e.type().isPresent());
        sheet.text(styles.heading(), FirstPage.MARGIN, y + 7, HEADING);
        if (any) {
            Chart chart = PosteriorChart.of(placement, catalogue, rows);
            sheet.text(
                    styles.small(),
                    FirstPage.MARGIN + document.lines().width(styles.heading(), HEADING) + 8,
                    y + 7,
                    "filled: combined; bars: 68% and 95%");
            sheet.chart(chart, FirstPage.MARGIN, y + 12, chartWidth, tall - 22, FRAME);
        } else {
            float at = y + 20;
            for (String line :
                    document.lines()
                            .wrap(
                                    styles.body(),
                                    sentence(placement.published().scheme()),
                                    chartWidth)) {
                sheet.text(styles.body(), FirstPage.MARGIN, at, line);
                at += styles.body().leadingPoint();
            }
        }
    }

    private static String sentence(String words) {
        return words.substring(0, 1).toUpperCase(Locale.ROOT) + words.substring(1) + ".";
    }

    private void keys(Sheet sheet, float left, float y) throws IOException {
        sheet.text(styles.heading(), left, y + 7, "Key numbers");
        sheet.rule(left, FirstPage.MARGIN + width, y + 11, document.theme().rule(), 0.5f);
        float at = y + 20.5f;
        for (KeyNumbers.Entry entry : keys) {
            sheet.text(styles.table().in(document.theme().quiet()), left, at, entry.label());
            for (String line : valueLines(entry)) {
                sheet.text(styles.table(), left + LABEL_WIDTH, at, line);
                at += styles.table().leadingPoint();
            }
            at += 1.6f;
        }
    }

    private List<String> valueLines(KeyNumbers.Entry entry) {
        return document.lines().wrap(styles.table(), entry.value(), KEY_WIDTH - LABEL_WIDTH, 3);
    }
}
