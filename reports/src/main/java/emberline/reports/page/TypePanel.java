package emberline.reports.page;

import emberline.catalogue.FeatureCatalogue;
import emberline.place.Placement;
import emberline.place.calibrated.Contribution;
import emberline.reports.chart.Chart;
import emberline.reports.chart.ContributionChart;
import emberline.reports.chart.PosteriorChart;
import emberline.reports.paint.Frame;
import emberline.survey.ObjectResult;
import java.io.IOException;
import java.util.List;
import java.util.Locale;

/** The middle of the first page: the chart of the type and beside it what pulled it which way. */
final class TypePanel {

    /** Fewest rows of relations for which there is room in any case. */
    static final int FEWEST_ROWS = 3;

    private static final int MOST_ROWS = 14;
    private static final float ROW = 9.2f;
    private static final float MOST_ROW = 13;
    private static final float CONTRIBUTIONS_WIDTH = 196;
    private static final float GUTTER = 12;
    private static final int FEWEST_CONTRIBUTIONS = 3;
    private static final Frame FRAME = new Frame(116, 2, 5, 24);

    private final ReportDocument document;
    private final FeatureCatalogue catalogue;
    private final Placement placement;
    private final Styles styles;
    private final float width;

    TypePanel(
            ReportDocument document, FeatureCatalogue catalogue, ObjectResult result, float width) {
        this.document = document;
        this.catalogue = catalogue;
        this.placement = result.placement().orElseThrow();
        this.styles = document.styles();
        this.width = width;
    }

    /** How many rows of relations there are to show, at least {@link #FEWEST_ROWS}. */
    int rows() {
        long rows =
                placement.published().estimates().stream()
                        .filter(e -> e.type().isPresent())
                        .count();
        return (int) Math.max(FEWEST_ROWS, Math.min(MOST_ROWS, rows));
    }

    /** The height that the panel takes up with so many rows (point). */
    float tall(int rows) {
        if (!any()) {
            return 44;
        }
        return 20 + (rows + 4.6f) * ROW + (float) (FRAME.top() + FRAME.bottom());
    }

    /** By how much the panel may grow where there is room (point). */
    float growth(int rows) {
        return any() ? rows * (MOST_ROW - ROW) : 0;
    }

    private boolean any() {
        return placement.calibrated().posterior().isPresent()
                || placement.published().estimates().stream().anyMatch(e -> e.type().isPresent());
    }

    void write(Sheet sheet, float y, float tall, int rows) throws IOException {
        String title = placement.type().isPresent() ? "Type" : "Type, if it were a late dwarf";
        sheet.text(styles.heading(), FirstPage.MARGIN, y + 7, title);
        if (!any()) {
            noType(sheet, y);
            return;
        }
        List<Contribution> contributions = placement.calibrated().contributions();
        boolean beside =
                contributions.size() >= FEWEST_CONTRIBUTIONS
                        && placement.calibrated().posterior().isPresent();
        float chartWidth = beside ? width - CONTRIBUTIONS_WIDTH - GUTTER : width;
        float heading = document.lines().width(styles.heading(), title) + 8;
        sheet.text(
                styles.small(),
                FirstPage.MARGIN + heading,
                y + 7,
                document.lines()
                        .fit(
                                styles.small(),
                                "filled: combined (dashed below); bars: 68%, 95%",
                                chartWidth - heading));
        Chart chart = PosteriorChart.of(placement, catalogue, rows);
        sheet.chart(
                chart,
                FirstPage.MARGIN,
                y + 11,
                chartWidth,
                tall - 20,
                document.frameFor(chart, FRAME, chartWidth / 2));
        if (beside) {
            contributions(sheet, FirstPage.MARGIN + chartWidth + GUTTER, y, tall, contributions);
        }
    }

    private void contributions(
            Sheet sheet, float left, float y, float tall, List<Contribution> contributions)
            throws IOException {
        String heading = "Which features pulled it";
        sheet.text(styles.heading(), left, y + 7, heading);
        long aside = contributions.stream().filter(Contribution::setAside).count();
        float from = document.lines().width(styles.heading(), heading) + 6;
        sheet.text(
                styles.small(),
                left + from,
                y + 7,
                document.lines()
                        .fit(
                                styles.small(),
                                "of " + contributions.size() + "; open: set aside (" + aside + ")",
                                CONTRIBUTIONS_WIDTH - from));
        int rows =
                (int) Math.max(FEWEST_CONTRIBUTIONS, (tall - 22 - FRAME.bottom()) / (ROW - 0.5f));
        Chart chart = ContributionChart.of(contributions, catalogue, rows);
        sheet.chart(
                chart,
                left,
                y + 11,
                CONTRIBUTIONS_WIDTH,
                tall - 20,
                document.frameFor(chart, FRAME, CONTRIBUTIONS_WIDTH / 2));
    }

    private void noType(Sheet sheet, float y) throws IOException {
        float at = y + 18;
        for (String line :
                document.lines()
                        .wrap(styles.body(), sentence(placement.published().scheme()), width, 2)) {
            sheet.text(styles.body(), FirstPage.MARGIN, at, line);
            at += styles.body().leadingPoint();
        }
    }

    private static String sentence(String words) {
        return words.substring(0, 1).toUpperCase(Locale.ROOT) + words.substring(1) + ".";
    }
}
