package emberline.reports.page;

import emberline.reports.attach.Digits;
import emberline.reports.chart.ResidualChart;
import emberline.reports.paint.Frame;
import emberline.survey.score.CheckScore;
import emberline.survey.score.Confusion;
import emberline.survey.score.Division;
import emberline.survey.score.TypeScore;
import emberline.survey.score.TypeScore.Figures;
import java.awt.Color;
import java.io.IOException;
import java.io.OutputStream;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/**
 * Writes the score of the product on known objects as one page: the differences of the types, how
 * honest their errors are, and the figures by range of type. The same score gives the same bytes.
 */
public final class CheckReport {

    private static final float GUTTER = 22;
    private static final float DIFFERENCES_TALL = 214;
    private static final float SMALL_TALL = 136;
    private static final Frame WIDE = new Frame(34, 4, 9, 25);
    private static final Color BOX = new Color(0xF3F5F8);
    private static final float BOX_PAD = 7;

    /** Right ends of the columns of figures (point from the margin). */
    private static final float[] COLUMNS = {150, 190, 232, 276, 330, 376, 420, 462, 505};

    private static final String[] NAMES = {
        "objects", "typed", "bias", "rms", "median off", "scatter", "sigma", "in 68%", "in 95%"
    };

    private static final float GRAVITY_SHIFT = 4;

    private static final String LIMITS =
            "Published types are good to half a subclass or so, and infrared and optical types of"
                    + " one object can differ by one or two; part of every difference is theirs."
                    + " Where a choice or a calibration of the product was made with objects of"
                    + " this list in view, the scores flatter it. Scores of a list hold for its"
                    + " instruments and its mix of objects.";

    private final ReportSettings settings;
    private final PrintRoom room = new PrintRoom();

    /**
     * A writer of scores.
     *
     * @param settings paper, version and seed
     */
    public CheckReport(ReportSettings settings) {
        this.settings = settings;
    }

    /**
     * Whether there is anything to draw.
     *
     * @param score the score of a list
     * @return true if at least one dwarf of known type was given a type
     */
    public static boolean canReport(CheckScore score) {
        return !score.typedDwarfs().isEmpty();
    }

    /**
     * Writes the page.
     *
     * @param score a score of which there {@link #canReport is anything to draw}
     * @param list the name of the list
     * @param remark what is to be said of the run, in sentences; may be blank
     * @param stream where the PDF goes; it is not closed
     * @throws IOException if it cannot be written
     * @throws IllegalArgumentException if there is nothing to draw
     */
    public void write(CheckScore score, String list, String remark, OutputStream stream)
            throws IOException {
        if (!canReport(score)) {
            throw new IllegalArgumentException(
                    list + ": no dwarf of known type was given a type: expected at least one");
        }
        room.print(
                document -> {
                    try (Sheet sheet = new Sheet(document, settings.paper())) {
                        new Page(document, sheet).write(score, list, remark);
                    }
                    List<String> parts = new ArrayList<>(List.of(list, remark));
                    score.objects().forEach(object -> parts.add(object.toString()));
                    PdfIdentity.stamp(document.pdf(), "Check of " + list, parts, settings);
                },
                stream);
    }

    /** The page while it is written, from the top down. */
    private final class Page {

        private final ReportDocument document;
        private final Sheet sheet;
        private final Styles styles;
        private final float width = settings.paper().widthPoint() - 2 * FirstPage.MARGIN;
        private final float right = FirstPage.MARGIN + width;

        Page(ReportDocument document, Sheet sheet) {
            this.document = document;
            this.sheet = sheet;
            this.styles = document.styles();
        }

        void write(CheckScore score, String list, String remark) throws IOException {
            float y = head(score, list, remark);
            float left = FirstPage.MARGIN;
            sheet.text(styles.heading(), left, y, "Found minus known type");
            sheet.chart(
                    ResidualChart.differences(score), left, y + 5, width, DIFFERENCES_TALL, WIDE);
            y += DIFFERENCES_TALL + 14;
            y =
                    small(
                                    "Bars: one sigma. Blue: listed with low gravity or as young; grey:"
                                            + " all other dwarfs. Diamonds: median of two subclasses"
                                            + " with the middle 68%. Triangles point to what lies"
                                            + " outside.",
                                    left, y, width)
                            + 10;
            float half = (width - GUTTER) / 2;
            float second = left + half + GUTTER;
            sheet.text(styles.heading(), left, y, "Differences in units of the stated error");
            sheet.text(styles.heading(), second, y, "Are the stated intervals true?");
            sheet.chart(ResidualChart.pulls(score), left, y + 5, half, SMALL_TALL, WIDE);
            sheet.chart(ResidualChart.coverage(score), second, y + 5, half, SMALL_TALL, WIDE);
            y += SMALL_TALL + 14;
            small(
                    "Curve: normal errors of the stated size. What is off by more than 5 sigma"
                            + " stands in the last steps.",
                    left,
                    y,
                    half);
            y =
                    small(
                                    "Share of known types inside an interval. Curve: normal errors of"
                                            + " the stated size; diamonds: the stated 68% and 95%"
                                            + " intervals.",
                                    second, y, half)
                            + 11;
            float limitsTop = limitsTop();
            figures(score, y, limitsTop - 6);
            limits(limitsTop);
            foot();
        }

        private float head(CheckScore score, String list, String remark) throws IOException {
            float y = FirstPage.TOP + 14;
            String title = document.lines().fit(styles.name(), "Check of " + list, width - 140);
            sheet.text(styles.name(), FirstPage.MARGIN, y, title);
            sheet.textRight(
                    styles.subhead(),
                    right,
                    y,
                    score.objects().size() + " objects, " + score.failed() + " failed");
            sheet.rule(FirstPage.MARGIN, right, y + 7, document.theme().ink(), 0.7f);
            y += 21;
            TypeScore last = score.types().get(score.types().size() - 1);
            String words = sentence(last.figures().isPresent() ? last : score.types().get(0));
            for (String line :
                    document.lines().wrap(styles.finding(), words + " " + remark, width)) {
                sheet.text(styles.finding(), FirstPage.MARGIN, y, line);
                y += styles.finding().leadingPoint();
            }
            return y + 4;
        }

        private String sentence(TypeScore score) {
            Figures figures = score.figures().orElseThrow();
            return "Of "
                    + score.objects()
                    + " objects ("
                    + score.label()
                    + ") "
                    + score.typed()
                    + " were given a type: off by "
                    + Digits.type(figures.medianAbsolute())
                    + " subclass in the median, rms "
                    + Digits.type(figures.rms())
                    + ", bias "
                    + signed(figures.bias())
                    + "; the known type lies inside the stated 68% interval for "
                    + percent(figures.inside68())
                    + " and inside the 95% interval for "
                    + percent(figures.inside95())
                    + ".";
        }

        private float small(String text, float left, float from, float room) throws IOException {
            float y = from;
            for (String line : document.lines().wrap(styles.small(), text, room)) {
                sheet.text(styles.small(), left, y, line);
                y += styles.small().leadingPoint();
            }
            return y;
        }

        /** The figures by range of type and by tier, as many rows as there is room for. */
        private void figures(CheckScore score, float from, float end) throws IOException {
            float y = from;
            sheet.text(styles.heading(), FirstPage.MARGIN, y, "Figures (subclass)");
            for (int c = 0; c < COLUMNS.length; c++) {
                Style quiet = styles.table().in(document.theme().quiet());
                sheet.textRight(quiet, FirstPage.MARGIN + COLUMNS[c], y, NAMES[c]);
            }
            sheet.rule(FirstPage.MARGIN, right, y + 3, document.theme().rule(), 0.5f);
            y += 11.5f;
            List<TypeScore> rows = new ArrayList<>(score.types());
            for (Division division : score.divisions()) {
                if (division.title().equals("type") || division.title().equals("tier")) {
                    String prefix = division.title().equals("tier") ? "tier " : "";
                    division.scores()
                            .forEach(
                                    s ->
                                            rows.add(
                                                    new TypeScore(
                                                            prefix + s.label(),
                                                            s.objects(),
                                                            s.typed(),
                                                            s.figures())));
                }
            }
            List<List<String>> lines = new ArrayList<>();
            for (TypeScore row : rows) {
                lines.add(cells(row));
            }
            y = table(lines, COLUMNS, y, end);
            gravity(score.gravity(), y + 8, end);
        }

        /** Rows of a label and numbers; what finds no room is said to stand elsewhere. */
        private float table(List<List<String>> rows, float[] columns, float from, float end)
                throws IOException {
            float y = from;
            for (int r = 0; r < rows.size(); r++) {
                boolean last = y + styles.table().leadingPoint() > end;
                if (last && r < rows.size() - 1) {
                    String left = rows.size() - r + " more rows stand in check.json";
                    sheet.text(styles.note(), FirstPage.MARGIN, y, left);
                    return y + styles.table().leadingPoint();
                }
                List<String> row = rows.get(r);
                String label = document.lines().fit(styles.table(), row.get(0), 118);
                sheet.text(styles.table(), FirstPage.MARGIN, y, label);
                for (int c = 1; c < row.size(); c++) {
                    sheet.textRight(
                            styles.table(), FirstPage.MARGIN + columns[c - 1], y, row.get(c));
                }
                y += styles.table().leadingPoint() + 0.4f;
            }
            return y;
        }

        /** Known gravity classes against those found, where there is room. */
        private void gravity(Confusion gravity, float from, float end) throws IOException {
            if (gravity.rows().isEmpty() || from + 3 * styles.table().leadingPoint() > end) {
                return;
            }
            sheet.text(styles.heading(), FirstPage.MARGIN, from, "Gravity as listed, M6 to L7");
            for (int c = 0; c < gravity.found().size() && c < COLUMNS.length; c++) {
                sheet.textRight(
                        styles.table().in(document.theme().quiet()),
                        FirstPage.MARGIN + COLUMNS[c] + GRAVITY_SHIFT,
                        from,
                        gravity.found().get(c));
            }
            sheet.rule(FirstPage.MARGIN, right, from + 3, document.theme().rule(), 0.5f);
            List<List<String>> rows = new ArrayList<>();
            for (Map.Entry<String, List<Integer>> known : gravity.rows().entrySet()) {
                List<String> cells = new ArrayList<>(List.of(known.getKey()));
                known.getValue().forEach(count -> cells.add(count.toString()));
                rows.add(cells);
            }
            float[] columns = COLUMNS.clone();
            for (int c = 0; c < columns.length; c++) {
                columns[c] += GRAVITY_SHIFT;
            }
            table(rows, columns, from + 11.5f, end);
        }

        private List<String> cells(TypeScore score) {
            List<String> cells = new ArrayList<>(List.of(score.label()));
            cells.add(Integer.toString(score.objects()));
            cells.add(Integer.toString(score.typed()));
            score.figures()
                    .ifPresent(
                            f -> {
                                cells.add(signed(f.bias()));
                                cells.add(Digits.type(f.rms()));
                                cells.add(Digits.type(f.medianAbsolute()));
                                cells.add(Digits.type(f.robustScatter()));
                                cells.add(Digits.type(f.medianSigma()));
                                cells.add(percent(f.inside68()));
                                cells.add(percent(f.inside95()));
                            });
            return cells;
        }

        private float limitsTop() {
            int lines = limitsLines().size();
            return settings.paper().heightPoint()
                    - FirstPage.FOOT
                    - 8
                    - (styles.heading().leadingPoint()
                            + lines * styles.body().leadingPoint()
                            + 2 * BOX_PAD
                            - 2);
        }

        private List<String> limitsLines() {
            return document.lines().wrap(styles.body(), LIMITS, width - 2 * BOX_PAD);
        }

        private void limits(float top) throws IOException {
            float tall = settings.paper().heightPoint() - FirstPage.FOOT - 8 - top;
            sheet.box(FirstPage.MARGIN, top, width, tall, BOX);
            float y = top + BOX_PAD + 6.5f;
            sheet.text(styles.heading(), FirstPage.MARGIN + BOX_PAD, y, "What this cannot tell");
            y += styles.heading().leadingPoint();
            for (String line : limitsLines()) {
                sheet.text(styles.body(), FirstPage.MARGIN + BOX_PAD, y, line);
                y += styles.body().leadingPoint();
            }
        }

        private void foot() throws IOException {
            float y = settings.paper().heightPoint() - FirstPage.FOOT + 14;
            sheet.textRight(
                    styles.small(),
                    right,
                    y,
                    "Emberline " + settings.programVersion() + ", seed " + settings.seed());
        }
    }

    private static String percent(double share) {
        return Digits.fixed(100 * share, 0) + "%";
    }

    private static String signed(double value) {
        String digits = Digits.type(Math.abs(value));
        return (value < 0 && !digits.equals("0.00") ? "\u2212" : "+") + digits;
    }
}
