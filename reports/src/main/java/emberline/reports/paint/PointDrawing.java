package emberline.reports.paint;

import emberline.reports.chart.Layer;
import emberline.reports.chart.Tone;
import emberline.reports.paint.LayerDrawing.Places;
import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.Shape;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;

/**
 * Draws points with their error bars: a diamond for the result, a disc for all else. A point
 * outside the chart stands at its edge as a triangle that points to it.
 */
final class PointDrawing {

    private static final double RADIUS = 1.9;
    private static final double DIAMOND = 3.2;

    private PointDrawing() {}

    static void draw(Graphics2D graphics, Places places, Layer.Points points, Theme theme) {
        Color colour = theme.colour(points.tone());
        for (Layer.Point point : points.points()) {
            graphics.setPaint(colour);
            graphics.setStroke(new BasicStroke(points.tone() == Tone.RESULT ? 0.9f : 0.6f));
            double x = places.clampedX(point.x());
            double y = places.clampedY(point.y());
            if (point.xLow() < point.xHigh()) {
                graphics.draw(
                        new Line2D.Double(
                                places.clampedX(point.xLow()),
                                y,
                                places.clampedX(point.xHigh()),
                                y));
            }
            if (point.yLow() < point.yHigh()) {
                graphics.draw(
                        new Line2D.Double(
                                x,
                                places.clampedY(point.yLow()),
                                x,
                                places.clampedY(point.yHigh())));
            }
            Shape mark = mark(places, point, points.tone(), x, y);
            graphics.setPaint(points.filled() ? colour : Color.WHITE);
            graphics.fill(mark);
            graphics.setPaint(points.tone() == Tone.RESULT ? theme.ink() : colour);
            graphics.setStroke(new BasicStroke(points.filled() ? 0.4f : 0.7f));
            graphics.draw(mark);
        }
    }

    private static Shape mark(Places places, Layer.Point point, Tone tone, double x, double y) {
        boolean above = places.y(point.y()) < places.area().getMinY();
        boolean below = places.y(point.y()) > places.area().getMaxY();
        boolean right = places.x(point.x()) > places.area().getMaxX();
        boolean left = places.x(point.x()) < places.area().getMinX();
        if (above || below) {
            double turn = above ? 1 : -1;
            return polygon(
                    x, y, x - DIAMOND, y + turn * 2 * DIAMOND, x + DIAMOND, y + turn * 2 * DIAMOND);
        }
        if (left || right) {
            double turn = left ? 1 : -1;
            return polygon(
                    x, y, x + turn * 2 * DIAMOND, y - DIAMOND, x + turn * 2 * DIAMOND, y + DIAMOND);
        }
        if (tone == Tone.RESULT) {
            return polygon(x, y - DIAMOND, x + DIAMOND, y, x, y + DIAMOND, x - DIAMOND, y);
        }
        return new Ellipse2D.Double(x - RADIUS, y - RADIUS, 2 * RADIUS, 2 * RADIUS);
    }

    private static Shape polygon(double... corners) {
        Path2D path = new Path2D.Double();
        path.moveTo(corners[0], corners[1]);
        for (int i = 2; i < corners.length; i += 2) {
            path.lineTo(corners[i], corners[i + 1]);
        }
        path.closePath();
        return path;
    }
}
