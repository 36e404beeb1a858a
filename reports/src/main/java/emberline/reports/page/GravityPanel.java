package emberline.reports.page;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurement.Measured;
import emberline.place.GravityScore;
import emberline.place.Placement;
import emberline.place.calibrated.Calibration;
import emberline.reports.chart.Chart;
import emberline.reports.chart.GravityChart;
import emberline.reports.paint.Frame;
import emberline.survey.ObjectResult;
import java.io.IOException;
import java.util.List;

/** The gravity charts of the first page, or why gravity was not judged. */
final class GravityPanel {

    private static final float CHART_TALL = 96;
    private static final String HEADING = "Gravity by published scores";
    private static final Frame FRAME = new Frame(25, 12, 4, 13);

    private final ReportDocument document;
    private final FeatureCatalogue catalogue;
    private final Calibration calibration;
    private final Styles styles;
    private final float width;

    GravityPanel(
            ReportDocument document,
            FeatureCatalogue catalogue,
            Calibration calibration,
            float width) {
        this.document = document;
        this.catalogue = catalogue;
        this.calibration = calibration;
        this.styles = document.styles();
        this.width = width;
    }

    /** The height that the panel takes up (point). */
    static float tall(ObjectResult result) {
        return scores(result).isEmpty() ? 26 : CHART_TALL + 17;
    }

    private static List<GravityScore> scores(ObjectResult result) {
        return result.placement()
                .filter(p -> p.gravity().gravityClass().isPresent())
                .map(p -> p.gravity().scores())
                .filter(all -> all.stream().anyMatch(s -> s.index() instanceof Measured))
                .orElse(List.of());
    }

    void write(Sheet sheet, ObjectResult result, float y) throws IOException {
        List<GravityScore> scores = scores(result);
        sheet.text(styles.heading(), FirstPage.MARGIN, y + 7, HEADING);
        Placement placement = result.placement().orElseThrow();
        if (scores.isEmpty()) {
            String reason =
                    placement.gravity().gravityClass().isPresent()
                            ? "None of the published indices was measured; the class rests on the"
                                    + " calibrated features."
                            : "Not judged: " + placement.gravity().reason() + ".";
            sheet.text(
                    styles.body(),
                    FirstPage.MARGIN,
                    y + 19,
                    document.lines().fit(styles.body(), reason, width));
            return;
        }
        float from = document.lines().width(styles.heading(), HEADING) + 8;
        String caption =
                "areas, pale to dark: field, intermediate, very low gravity by "
                        + source(scores)
                        + "; lines: loci of field (full), very low (dashed)";
        sheet.text(
                styles.small(),
                FirstPage.MARGIN + from,
                y + 7,
                document.lines().fit(styles.small(), caption, width - from));
        float each = (width - 3 * 8) / 4;
        GravityChart charts = new GravityChart(catalogue, calibration);
        int column = 0;
        for (GravityScore score : scores.subList(0, Math.min(4, scores.size()))) {
            Chart chart = charts.of(score, placement.type());
            float left = FirstPage.MARGIN + column * (each + 8);
            sheet.chart(chart, left, y + 11, each, CHART_TALL, FRAME);
            String words =
                    score.score().isPresent()
                            ? "score " + score.score().getAsInt()
                            : score.reason().startsWith("not scored")
                                    ? "not scored here"
                                    : "not measured";
            sheet.textRight(styles.small(), left + each - 4, y + 20, words);
            column++;
        }
    }

    private String source(List<GravityScore> scores) {
        String feature = scores.get(0).feature().id();
        return catalogue.gravityThresholds().stream()
                .filter(t -> t.feature().equals(feature))
                .map(t -> t.source().shortCite())
                .findFirst()
                .orElse("");
    }
}
