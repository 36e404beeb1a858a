package emberline.reports.page;

import emberline.judge.Judgement;
import emberline.judge.LedgerEntry;
import emberline.place.Placement;
import emberline.place.kind.Kin;
import emberline.reports.chart.Chart;
import emberline.reports.chart.KindChart;
import emberline.reports.chart.LedgerChart;
import emberline.reports.chart.MassAgeChart;
import emberline.reports.paint.Frame;
import emberline.survey.ObjectResult;
import java.io.IOException;
import java.util.List;

/**
 * What the decision rests on: the ledger of the evidence and the plane of mass and age; for an
 * object that was not judged the kinds with their probabilities and the nearest kin. Beside them
 * the key numbers.
 */
final class EvidencePanel {

    private static final float LEAST_TALL = 112;
    private static final float LEDGER_WIDTH = 192;
    private static final float PLANE_WIDTH = 150;
    private static final float GUTTER = 13;
    private static final float LABEL_WIDTH = 50;
    private static final float BETWEEN = 1;
    private static final int KIN = 5;
    private static final Frame LEDGER = new Frame(60, 2, 4, 24);
    private static final Frame PLANE = new Frame(34, 2, 14, 24);

    private final ReportDocument document;
    private final ObjectResult result;
    private final List<KeyNumbers.Entry> keys;
    private final Styles styles;
    private final float keysWidth;

    EvidencePanel(ReportDocument document, ObjectResult result, float width) {
        this.document = document;
        this.result = result;
        this.keys = KeyNumbers.found(result);
        this.styles = document.styles();
        this.keysWidth = width - LEDGER_WIDTH - PLANE_WIDTH - 2 * GUTTER;
    }

    /** The height that the panel takes up (point). */
    float tall() {
        float lines = 22;
        for (KeyNumbers.Entry entry : keys) {
            lines += valueLines(entry).size() * styles.table().leadingPoint() + BETWEEN;
        }
        return Math.max(LEAST_TALL, lines);
    }

    void write(Sheet sheet, float y) throws IOException {
        float plane = FirstPage.MARGIN + LEDGER_WIDTH + GUTTER;
        if (result.judgement().isPresent()) {
            judged(sheet, result.judgement().get(), plane, y);
        } else {
            notJudged(sheet, result.placement().orElseThrow(), plane, y);
        }
        keys(sheet, plane + PLANE_WIDTH + GUTTER, y);
    }

    private void judged(Sheet sheet, Judgement judgement, float plane, float y) throws IOException {
        boolean order =
                judgement.substellarLedger().entries().stream()
                        .anyMatch(LedgerEntry::dependsOnOrder);
        heading(
                sheet,
                FirstPage.MARGIN,
                y,
                "Evidence, step by step",
                order ? "*: depends on the order" : "",
                LEDGER_WIDTH);
        float tall = tall() - 12;
        Chart ledger = LedgerChart.of(judgement.substellarLedger());
        sheet.chart(ledger, FirstPage.MARGIN, y + 11, LEDGER_WIDTH, tall, LEDGER);
        heading(sheet, plane, y, "Mass and age", "areas: 68%, 95%", PLANE_WIDTH);
        sheet.chart(MassAgeChart.of(judgement), plane, y + 11, PLANE_WIDTH, tall, PLANE);
    }

    private void notJudged(Sheet sheet, Placement placement, float right, float y)
            throws IOException {
        heading(sheet, FirstPage.MARGIN, y, "Kind of object", "", LEDGER_WIDTH);
        if (placement.kind().probabilities().isEmpty()) {
            String reason = "Not judged: " + placement.kind().reason() + ".";
            paragraph(sheet, FirstPage.MARGIN, y + 20, LEDGER_WIDTH, reason);
        } else {
            Chart kinds = KindChart.of(placement.kind());
            sheet.chart(
                    kinds,
                    FirstPage.MARGIN,
                    y + 11,
                    LEDGER_WIDTH,
                    tall() - 12,
                    document.frameFor(kinds, LEDGER, LEDGER_WIDTH / 2));
        }
        heading(sheet, right, y, "Nearest reference objects", "", PLANE_WIDTH);
        float at = y + 20;
        List<Kin> kin = placement.kin();
        if (kin.isEmpty()) {
            paragraph(sheet, right, at, PLANE_WIDTH, "None was compared.");
        }
        for (Kin one : kin.subList(0, Math.min(KIN, kin.size()))) {
            String name = document.lines().fit(styles.table(), one.object(), PLANE_WIDTH);
            sheet.text(styles.table(), right, at, name);
            at += styles.table().leadingPoint();
            String what = KinText.what(one) + "; distance " + KinText.distance(one);
            sheet.text(
                    styles.note(),
                    right + 6,
                    at,
                    document.lines().fit(styles.note(), what, PLANE_WIDTH - 6));
            at += styles.table().leadingPoint();
        }
    }

    private void heading(Sheet sheet, float left, float y, String words, String remark, float width)
            throws IOException {
        sheet.text(styles.heading(), left, y + 7, words);
        if (!remark.isEmpty()) {
            float from = document.lines().width(styles.heading(), words) + 6;
            sheet.text(
                    styles.small(),
                    left + from,
                    y + 7,
                    document.lines().fit(styles.small(), remark, width - from));
        }
    }

    private void paragraph(Sheet sheet, float left, float y, float width, String text)
            throws IOException {
        float at = y;
        for (String line : document.lines().wrap(styles.body(), text, width, 6)) {
            sheet.text(styles.body(), left, at, line);
            at += styles.body().leadingPoint();
        }
    }

    private void keys(Sheet sheet, float left, float y) throws IOException {
        sheet.text(styles.heading(), left, y + 7, "Key numbers");
        sheet.rule(left, left + keysWidth, y + 11, document.theme().rule(), 0.5f);
        float at = y + 20;
        for (KeyNumbers.Entry entry : keys) {
            sheet.text(styles.table().in(document.theme().quiet()), left, at, entry.label());
            for (String line : valueLines(entry)) {
                sheet.text(styles.table(), left + LABEL_WIDTH, at, line);
                at += styles.table().leadingPoint();
            }
            at += BETWEEN;
        }
    }

    private List<String> valueLines(KeyNumbers.Entry entry) {
        return document.lines().wrap(styles.table(), entry.value(), keysWidth - LABEL_WIDTH, 3);
    }
}
