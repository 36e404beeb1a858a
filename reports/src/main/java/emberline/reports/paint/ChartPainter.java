package emberline.reports.paint;

import emberline.reports.chart.Chart;
import emberline.reports.chart.Layer;
import java.awt.Font;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.Rectangle2D;
import org.jfree.chart.axis.AxisSpace;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.ui.RectangleInsets;

/** Draws charts with JFreeChart. Safe for use by several threads. */
public final class ChartPainter {

    private final Theme theme;
    private final ChartFonts fonts;

    /**
     * A painter.
     *
     * @param theme colours and sizes
     * @param regular font of labels
     * @param bold font of titles
     */
    public ChartPainter(Theme theme, Font regular, Font bold) {
        this.theme = theme;
        this.fonts = ChartFonts.of(theme, regular, bold);
    }

    /**
     * Draws a chart.
     *
     * @param chart the chart
     * @param graphics where to draw, in points, origin at the top left
     * @param width full width (point)
     * @param height full height (point)
     * @param frame the room around the data area
     */
    public void paint(Chart chart, Graphics2D graphics, double width, double height, Frame frame) {
        XYPlot plot =
                new XYPlot(
                        null,
                        new TickedAxis(chart.x(), theme, fonts),
                        new TickedAxis(chart.y(), theme, fonts),
                        null);
        plot.setInsets(RectangleInsets.ZERO_INSETS);
        plot.setAxisOffset(RectangleInsets.ZERO_INSETS);
        plot.setBackgroundPaint(null);
        plot.setDomainGridlinesVisible(false);
        plot.setRangeGridlinesVisible(false);
        plot.setOutlinePaint(theme.ink());
        plot.setOutlineStroke(fonts.hairline());
        AxisSpace below = new AxisSpace();
        below.setBottom(frame.bottom());
        below.setTop(frame.top());
        AxisSpace beside = new AxisSpace();
        beside.setLeft(frame.left());
        beside.setRight(frame.right());
        plot.setFixedDomainAxisSpace(below);
        plot.setFixedRangeAxisSpace(beside);
        for (Layer layer : chart.layers()) {
            plot.addAnnotation(new LayerDrawing(layer, theme, fonts), false);
        }
        graphics.setRenderingHint(
                RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
        plot.draw(graphics, new Rectangle2D.Double(0, 0, width, height), null, null, null);
        if (!chart.title().isEmpty()) {
            graphics.setFont(fonts.title());
            graphics.setPaint(theme.ink());
            graphics.drawString(chart.title(), (float) frame.left() + 1, (float) frame.top() - 3f);
        }
    }
}
