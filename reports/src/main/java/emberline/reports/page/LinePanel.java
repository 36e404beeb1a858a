package emberline.reports.page;

import emberline.reports.chart.Chart;
import emberline.reports.paint.Frame;
import java.io.IOException;
import java.util.List;

/** Small charts of the surroundings of atomic lines, side by side. */
final class LinePanel {

    /** The most charts side by side. */
    static final int MOST = 5;

    private static final float CHART_TALL = 66;
    private static final float GUTTER = 6;
    private static final Frame FRAME = new Frame(20, 11, 5, 13);
    private static final String HEADING = "Lines";

    private final ReportDocument document;
    private final Styles styles;
    private final float width;

    LinePanel(ReportDocument document, float width) {
        this.document = document;
        this.styles = document.styles();
        this.width = width;
    }

    /** The height that the panel takes up (point). */
    static float tall(List<Chart> charts) {
        return charts.isEmpty() ? 0 : CHART_TALL + 18;
    }

    void write(Sheet sheet, List<Chart> charts, float y) throws IOException {
        sheet.text(styles.heading(), FirstPage.MARGIN, y + 7, HEADING);
        sheet.text(
                styles.small(),
                FirstPage.MARGIN + document.lines().width(styles.heading(), HEADING) + 8,
                y + 7,
                "flux over its mean against wavelength (µm, vacuum); shaded: one sigma; dashed: the"
                        + " lines at rest");
        float each = (width - (MOST - 1) * GUTTER) / MOST;
        float left = FirstPage.MARGIN;
        for (Chart chart : charts) {
            sheet.chart(chart, left, y + 11, each, CHART_TALL, FRAME);
            left += each + GUTTER;
        }
    }
}
