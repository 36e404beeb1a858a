package emberline.reports.page;

import emberline.judge.plan.SignalPlan;
import emberline.reports.attach.PlanTable;
import emberline.reports.attach.TableFormat;
import emberline.reports.chart.SignalChart;
import emberline.reports.paint.Frame;
import java.io.IOException;
import java.io.OutputStream;
import java.util.List;
import java.util.OptionalDouble;

/**
 * Writes the plan of a spectrum as one page with its charts. The same plan gives the same bytes.
 */
public final class PlanReport {

    private static final float CERTAINTY_TALL = 250;
    private static final float ERROR_TALL = 150;
    private static final Frame WIDE = new Frame(34, 4, 9, 25);

    private final ReportSettings settings;
    private final PrintRoom room = new PrintRoom();

    /**
     * A writer of plans.
     *
     * @param settings paper, version and seed
     */
    public PlanReport(ReportSettings settings) {
        this.settings = settings;
    }

    /**
     * Writes the page.
     *
     * @param plan a plan of at least two steps
     * @param stream where the PDF goes; it is not closed
     * @throws IOException if it cannot be written
     */
    public void write(SignalPlan plan, OutputStream stream) throws IOException {
        PlanTable table = new PlanTable(plan, OptionalDouble.empty());
        room.print(
                document -> {
                    try (Sheet sheet = new Sheet(document, settings.paper())) {
                        write(document, sheet, plan, table.title());
                    }
                    PdfIdentity.stamp(
                            document.pdf(),
                            "Plan: " + table.title(),
                            List.of(table.print(TableFormat.CSV)),
                            settings);
                },
                stream);
    }

    private void write(ReportDocument document, Sheet sheet, SignalPlan plan, String title)
            throws IOException {
        Styles styles = document.styles();
        float left = FirstPage.MARGIN;
        float width = settings.paper().widthPoint() - 2 * left;
        float y = FirstPage.TOP + 14;
        sheet.text(styles.name(), left, y, document.lines().fit(styles.name(), title, width));
        sheet.rule(left, left + width, y + 7, document.theme().ink(), 0.7f);
        y += 21;
        y = paragraph(document, sheet, styles.finding(), plan.words(), y) + 8;
        sheet.text(styles.heading(), left, y, "How sure the answer becomes");
        sheet.chart(SignalChart.certainty(plan), left, y + 5, width, CERTAINTY_TALL, WIDE);
        y += CERTAINTY_TALL + 14;
        y =
                paragraph(
                                document,
                                sheet,
                                styles.small(),
                                "Diamonds: median probability of the answer. Circles: share of "
                                        + plan.question().draws()
                                        + " drawn spectra whose answer is sure. Line: what counts"
                                        + " as sure.",
                                y)
                        + 12;
        sheet.text(styles.heading(), left, y, "Error of the type");
        sheet.chart(SignalChart.typeError(plan), left, y + 5, width, ERROR_TALL, WIDE);
        y += ERROR_TALL + 18;
        sheet.text(styles.heading(), left, y, "What this cannot tell");
        paragraph(
                document,
                sheet,
                styles.body(),
                PlanTable.limits() + " It supports and does not replace expert judgement.",
                y + styles.heading().leadingPoint());
        sheet.textRight(
                styles.small(),
                left + width,
                settings.paper().heightPoint() - FirstPage.FOOT + 14,
                "Emberline " + settings.programVersion() + ", seed " + plan.question().seed());
    }

    private float paragraph(
            ReportDocument document, Sheet sheet, Style style, String text, float from)
            throws IOException {
        float y = from;
        float width = settings.paper().widthPoint() - 2 * FirstPage.MARGIN;
        for (String line : document.lines().wrap(style, text, width)) {
            sheet.text(style, FirstPage.MARGIN, y, line);
            y += style.leadingPoint();
        }
        return y;
    }
}
