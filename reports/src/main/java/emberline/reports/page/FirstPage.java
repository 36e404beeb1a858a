package emberline.reports.page;

import emberline.catalogue.FeatureCatalogue;
import emberline.place.GravityScore;
import emberline.place.GravityVerdict;
import emberline.place.Placement;
import emberline.place.RelationEstimate;
import emberline.place.RelationEstimate.Use;
import emberline.place.TypeEstimate;
import emberline.reports.chart.Chart;
import emberline.reports.chart.ChartSize;
import emberline.reports.chart.GravityChart;
import emberline.reports.chart.PosteriorChart;
import emberline.reports.chart.SpectrumChart;
import emberline.reports.paint.Frame;
import emberline.spectrum.Finding;
import emberline.spectrum.Finding.Severity;
import emberline.survey.ObjectResult;
import java.awt.Color;
import java.io.IOException;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;

/** The first page: what the object is, how sure that is, and why. */
final class FirstPage {

    static final float MARGIN = 45;
    static final float TOP = 44;
    static final float FOOT = 46;

    private static final float HEADLINE_WIDTH = 165;
    private static final float GRAVITY_TALL = 112;
    private static final float LEAST_SPECTRUM = 150;
    private static final float MOST_SPECTRUM = 345;
    private static final float KEY_WIDTH = 176;
    private static final float GUTTER = 18;
    private static final float BOX_PAD = 7;
    private static final int MOST_RELATIONS = 17;
    private static final float RELATION_ROW = 9.2f;
    private static final float MOST_RELATION_ROW = 15;
    private static final int MOST_WARNINGS = 2;
    private static final String TYPE_HEADING = "Type by published relations";
    private static final String GRAVITY_HEADING = "Gravity by published scores";
    private static final Color BOX = new Color(0xF3F5F8);
    private static final Frame SPECTRUM_FRAME = new Frame(32, 4, 3, 24);
    private static final Frame RELATIONS_FRAME = new Frame(122, 2, 5, 24);
    private static final Frame GRAVITY_FRAME = new Frame(25, 12, 4, 13);

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

    void write(Sheet sheet, ObjectResult result) throws IOException {
        float y = head(sheet, result);
        List<String> limits =
                document.lines().wrap(styles.body(), LimitsText.of(result), width - 2 * BOX_PAD);
        float limitsTall =
                styles.heading().leadingPoint()
                        + limits.size() * styles.body().leadingPoint()
                        + 2 * BOX_PAD
                        - 2;
        float limitsTop = paper.heightPoint() - FOOT - 8 - limitsTall;
        float gravityTall = gravityTall(result);
        List<KeyNumbers.Entry> keys = KeyNumbers.of(result);
        float middleTall = middleTall(result, keys);
        float forSpectrum = limitsTop - y - gravityTall - middleTall - 30;
        float tall = Math.max(LEAST_SPECTRUM, Math.min(MOST_SPECTRUM, forSpectrum));
        float most = relationRows(result) * (MOST_RELATION_ROW - RELATION_ROW);
        middleTall += Math.max(0, Math.min(most, forSpectrum - tall));
        y = spectrum(sheet, result, y, tall) + 12;
        middle(sheet, result, keys, y, middleTall);
        y += middleTall;
        gravity(sheet, result, y);
        limits(sheet, limits, limitsTop, limitsTall);
    }

    /** Name and type, the finding, warnings. Returns the place below them. */
    private float head(Sheet sheet, ObjectResult result) throws IOException {
        Optional<TypeEstimate> type = result.placement().flatMap(Placement::type);
        List<String> name =
                document.lines()
                        .wrap(
                                styles.name(),
                                result.candidate().name(),
                                width - HEADLINE_WIDTH - GUTTER,
                                3);
        float y = TOP + 14;
        float right = MARGIN + width;
        float baseline = y;
        for (String line : name) {
            sheet.text(styles.name(), MARGIN, baseline, line);
            baseline += styles.name().leadingPoint();
        }
        String headline = type.map(FindingSentence::withError).orElse("no type");
        sheet.textRight(styles.headline(), right, y + 1, headline);
        result.placement()
                .ifPresent(
                        p -> {
                            String gravity = gravityWords(p.gravity());
                            try {
                                sheet.textRight(styles.subhead(), right, y + 14.5f, gravity);
                            } catch (IOException e) {
                                throw new java.io.UncheckedIOException(e);
                            }
                        });
        float below = Math.max(baseline - styles.name().leadingPoint() + 7, y + 19);
        sheet.rule(MARGIN, right, below, document.theme().ink(), 0.7f);
        float at = below + 14;
        for (String line :
                document.lines().wrap(styles.finding(), FindingSentence.of(result), width)) {
            sheet.text(styles.finding(), MARGIN, at, line);
            at += styles.finding().leadingPoint();
        }
        return warnings(sheet, result, at);
    }

    private float warnings(Sheet sheet, ObjectResult result, float from) throws IOException {
        float y = from;
        List<Finding> warnings =
                result.findings().stream()
                        .filter(f -> f.severity() == Severity.WARNING)
                        .limit(MOST_WARNINGS)
                        .toList();
        for (Finding warning : warnings) {
            String text = "Warning: " + warning.text() + ".";
            for (String line : document.lines().wrap(styles.warning(), text, width, 2)) {
                sheet.text(styles.warning(), MARGIN, y, line);
                y += styles.warning().leadingPoint();
            }
        }
        return y - 3;
    }

    private static String gravityWords(GravityVerdict verdict) {
        OptionalDouble share = FindingSentence.share(verdict);
        return verdict.gravityClass()
                .map(
                        g ->
                                g.label()
                                        + (share.isPresent()
                                                ? "   P "
                                                        + FindingSentence.probability(
                                                                share.getAsDouble())
                                                : ""))
                .orElse("gravity not judged");
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

    private static int relationRows(ObjectResult result) {
        List<RelationEstimate> estimates =
                result.placement().map(p -> p.published().estimates()).orElse(List.of());
        long rows =
                estimates.stream()
                        .filter(e -> e.use() == Use.COMBINED || e.use() == Use.SHOWN)
                        .count();
        return (int) Math.max(4, Math.min(MOST_RELATIONS, rows));
    }

    private float middleTall(ObjectResult result, List<KeyNumbers.Entry> keys) {
        float chart =
                (relationRows(result) + 1.6f) * RELATION_ROW
                        + (float) (RELATIONS_FRAME.top() + RELATIONS_FRAME.bottom());
        float lines = 0;
        for (KeyNumbers.Entry entry : keys) {
            lines += valueLines(entry).size() * styles.table().leadingPoint() + 1.6f;
        }
        return 14 + Math.max(chart, lines) + 8;
    }

    private List<String> valueLines(KeyNumbers.Entry entry) {
        return document.lines().wrap(styles.table(), entry.value(), KEY_WIDTH - 68, 3);
    }

    private void middle(
            Sheet sheet,
            ObjectResult result,
            List<KeyNumbers.Entry> keys,
            float y,
            float middleTall)
            throws IOException {
        float chartWidth = width - KEY_WIDTH - GUTTER;
        Placement placement = result.placement().orElseThrow();
        boolean any =
                placement.published().estimates().stream()
                        .anyMatch(e -> e.use() == Use.COMBINED || e.use() == Use.SHOWN);
        sheet.text(styles.heading(), MARGIN, y + 7, TYPE_HEADING);
        if (any) {
            Chart chart = PosteriorChart.of(placement.published(), catalogue, relationRows(result));
            sheet.text(
                    styles.small(),
                    MARGIN + document.lines().width(styles.heading(), TYPE_HEADING) + 8,
                    y + 7,
                    "filled: combined; open: shown for comparison; bars: 68% and 95%");
            sheet.chart(chart, MARGIN, y + 12, chartWidth, middleTall - 22, RELATIONS_FRAME);
        } else {
            float at = y + 20;
            for (String line :
                    document.lines()
                            .wrap(
                                    styles.body(),
                                    sentence(placement.published().scheme()),
                                    chartWidth)) {
                sheet.text(styles.body(), MARGIN, at, line);
                at += styles.body().leadingPoint();
            }
        }
        float left = MARGIN + chartWidth + GUTTER;
        sheet.text(styles.heading(), left, y + 7, "Key numbers");
        sheet.rule(left, MARGIN + width, y + 11, document.theme().rule(), 0.5f);
        float at = y + 20.5f;
        for (KeyNumbers.Entry entry : keys) {
            sheet.text(styles.table().in(document.theme().quiet()), left, at, entry.label());
            for (String line : valueLines(entry)) {
                sheet.text(styles.table(), left + 68, at, line);
                at += styles.table().leadingPoint();
            }
            at += 1.6f;
        }
    }

    private static String sentence(String words) {
        return words.substring(0, 1).toUpperCase(Locale.ROOT) + words.substring(1) + ".";
    }

    private static List<GravityScore> scores(ObjectResult result) {
        return result.placement()
                .filter(p -> p.gravity().gravityClass().isPresent())
                .map(p -> p.gravity().scores())
                .orElse(List.of());
    }

    private float gravityTall(ObjectResult result) {
        return scores(result).isEmpty() ? 34 : GRAVITY_TALL + 18;
    }

    private void gravity(Sheet sheet, ObjectResult result, float y) throws IOException {
        List<GravityScore> scores = scores(result);
        sheet.text(styles.heading(), MARGIN, y + 7, GRAVITY_HEADING);
        Placement placement = result.placement().orElseThrow();
        if (scores.isEmpty()) {
            String reason = "Not judged: " + placement.gravity().reason() + ".";
            sheet.text(
                    styles.body(),
                    MARGIN,
                    y + 19,
                    document.lines().fit(styles.body(), reason, width));
            return;
        }
        sheet.text(
                styles.small(),
                MARGIN + document.lines().width(styles.heading(), GRAVITY_HEADING) + 8,
                y + 7,
                "index against type; areas from pale to dark: field, intermediate, very low gravity;"
                        + " limits of "
                        + source(scores));
        float each = (width - 3 * 8) / 4;
        GravityChart charts = new GravityChart(catalogue);
        int column = 0;
        for (GravityScore score : scores.subList(0, Math.min(4, scores.size()))) {
            Chart chart = charts.of(score, placement.type());
            float left = MARGIN + column * (each + 8);
            sheet.chart(chart, left, y + 11, each, GRAVITY_TALL, GRAVITY_FRAME);
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
