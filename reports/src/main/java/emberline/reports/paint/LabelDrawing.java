package emberline.reports.paint;

import emberline.reports.chart.Layer;
import emberline.reports.chart.PlacedLabel;
import emberline.reports.chart.PlacedLabel.Span;
import emberline.reports.chart.Tone;
import emberline.reports.paint.LayerDrawing.Places;
import java.awt.BasicStroke;
import java.awt.Graphics2D;
import java.awt.font.FontRenderContext;
import java.awt.geom.Line2D;

/** Draws labels in rows: the text, below it a bar for each band and a tick for each line. */
final class LabelDrawing {

    private static final float BAR_POINT = 0.9f;
    private static final double TICK_POINT = 3;

    /** Widths of texts without rounding to pixels. */
    static final FontRenderContext EXACT = new FontRenderContext(null, true, true);

    private LabelDrawing() {}

    static void draw(
            Graphics2D graphics,
            Places places,
            Layer.Labels labels,
            Theme theme,
            ChartFonts fonts) {
        double top = places.area().getMinY() + 2;
        for (PlacedLabel label : labels.labels()) {
            double baseline =
                    top + label.row() * labels.rowHeightPoint() + theme.labelSizePoint() * 0.95;
            double bar = baseline + 2.4;
            graphics.setPaint(theme.colour(label.tone()));
            graphics.setFont(fonts.label());
            double width = fonts.label().getStringBounds(label.text(), EXACT).getWidth();
            graphics.drawString(
                    label.text(), (float) (places.x(label.centre()) - width / 2), (float) baseline);
            graphics.setStroke(
                    new BasicStroke(BAR_POINT, BasicStroke.CAP_BUTT, BasicStroke.JOIN_MITER));
            for (Span span : label.spans()) {
                double from = places.clampedX(span.from());
                double to = places.clampedX(span.to());
                if (label.tone() == Tone.LINE) {
                    graphics.setStroke(fonts.hairline());
                    graphics.draw(new Line2D.Double(from, bar - 0.8, from, bar + TICK_POINT - 0.8));
                } else {
                    graphics.draw(new Line2D.Double(from, bar, Math.max(to, from + 0.6), bar));
                }
            }
        }
    }
}
