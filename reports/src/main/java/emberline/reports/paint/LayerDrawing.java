package emberline.reports.paint;

import emberline.reports.chart.Curve;
import emberline.reports.chart.Layer;
import emberline.reports.chart.Tone;
import java.awt.BasicStroke;
import java.awt.Graphics2D;
import java.awt.Shape;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;
import org.jfree.chart.annotations.AbstractXYAnnotation;
import org.jfree.chart.axis.ValueAxis;
import org.jfree.chart.plot.PlotRenderingInfo;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.ui.RectangleEdge;

/** Draws one layer of a chart on a plot. */
final class LayerDrawing extends AbstractXYAnnotation {

    private static final long serialVersionUID = 1L;
    private static final float CURVE_POINT = 0.55f;
    private static final float LOCUS_POINT = 0.9f;
    private static final float SEGMENT_POINT = 0.6f;
    private static final double HATCH_STEP = 4;
    private static final double NOTE_GAP = 3;

    private final transient Layer layer;
    private final transient Theme theme;
    private final transient ChartFonts fonts;

    LayerDrawing(Layer layer, Theme theme, ChartFonts fonts) {
        this.layer = layer;
        this.theme = theme;
        this.fonts = fonts;
    }

    @Override
    public void draw(
            Graphics2D graphics,
            XYPlot plot,
            Rectangle2D area,
            ValueAxis domain,
            ValueAxis range,
            int index,
            PlotRenderingInfo info) {
        Places places = new Places(area, domain, range);
        if (layer instanceof Curve curve) {
            Shape before = graphics.getClip();
            double top = places.clampedY(Math.min(curve.ceiling(), range.getUpperBound()));
            graphics.clip(
                    new Rectangle2D.Double(
                            area.getX(), top, area.getWidth(), area.getMaxY() - top));
            draw(graphics, places, curve);
            graphics.setClip(before);
        } else if (layer instanceof Layer.Points points) {
            PointDrawing.draw(graphics, places, points, theme);
        } else if (layer instanceof Layer.Region region) {
            draw(graphics, places, region);
        } else if (layer instanceof Layer.Area chain) {
            draw(graphics, places, chain);
        } else if (layer instanceof Layer.Interval interval) {
            draw(graphics, places, interval);
        } else if (layer instanceof Layer.Labels labels) {
            LabelDrawing.draw(graphics, places, labels, theme, fonts);
        } else if (layer instanceof Layer.Note note) {
            draw(graphics, places, note);
        } else if (layer instanceof Layer.Segment segment) {
            draw(graphics, places, segment);
        } else if (layer instanceof Layer.Blocks blocks) {
            draw(graphics, places, blocks);
        }
    }

    private void draw(Graphics2D graphics, Places places, Layer.Note note) {
        graphics.setFont(fonts.label());
        graphics.setPaint(theme.colour(note.tone()));
        double width = fonts.label().getStringBounds(note.text(), LabelDrawing.EXACT).getWidth();
        double shift =
                switch (note.side()) {
                    case LEFT -> -width - NOTE_GAP;
                    case RIGHT -> NOTE_GAP;
                    case ABOVE -> 1;
                    case ABOVE_LEFT -> -width - 1;
                };
        boolean above = note.side() == Layer.Side.ABOVE || note.side() == Layer.Side.ABOVE_LEFT;
        double x = places.clampedX(note.x()) + shift;
        double baseline =
                places.clampedY(note.y()) + (above ? -1.6 : theme.labelSizePoint() * 0.36);
        graphics.drawString(note.text(), (float) x, (float) baseline);
    }

    private void draw(Graphics2D graphics, Places places, Layer.Segment segment) {
        graphics.setPaint(theme.colour(segment.tone()));
        graphics.setStroke(
                segment.dashed() ? dashed(SEGMENT_POINT) : new BasicStroke(SEGMENT_POINT));
        graphics.draw(
                new Line2D.Double(
                        places.clampedX(segment.fromX()),
                        places.clampedY(segment.fromY()),
                        places.clampedX(segment.toX()),
                        places.clampedY(segment.toY())));
    }

    private static BasicStroke dashed(float width) {
        return new BasicStroke(
                width,
                BasicStroke.CAP_BUTT,
                BasicStroke.JOIN_ROUND,
                1,
                new float[] {2.4f, 1.8f},
                0);
    }

    private void draw(Graphics2D graphics, Places places, Layer.Blocks blocks) {
        Path2D path = new Path2D.Double();
        for (Layer.Block block : blocks.blocks()) {
            double left = places.clampedX(block.left());
            double top = places.clampedY(block.top());
            path.append(
                    new Rectangle2D.Double(
                            left,
                            top,
                            places.clampedX(block.right()) - left,
                            places.clampedY(block.bottom()) - top),
                    false);
        }
        graphics.setPaint(theme.colour(blocks.tone()));
        graphics.fill(path);
        if (blocks.outlined()) {
            graphics.setPaint(theme.ink());
            graphics.setStroke(new BasicStroke(theme.hairlinePoint() * 0.7f));
            graphics.draw(path);
        }
    }

    /** Values as places on the paper. */
    record Places(Rectangle2D area, ValueAxis domain, ValueAxis range) {

        double x(double value) {
            return domain.valueToJava2D(value, area, RectangleEdge.BOTTOM);
        }

        double y(double value) {
            return range.valueToJava2D(value, area, RectangleEdge.LEFT);
        }

        double clampedX(double value) {
            return Math.max(area.getMinX(), Math.min(area.getMaxX(), x(value)));
        }

        double clampedY(double value) {
            return Math.max(area.getMinY(), Math.min(area.getMaxY(), y(value)));
        }
    }

    private void draw(Graphics2D graphics, Places places, Curve curve) {
        int start = 0;
        List<int[]> pieces = new ArrayList<>();
        for (int i = 0; i <= curve.size(); i++) {
            if (i == curve.size() || !Double.isFinite(curve.y(i))) {
                if (i - start > 0) {
                    pieces.add(new int[] {start, i});
                }
                start = i + 1;
            }
        }
        if (curve.hasBand()) {
            graphics.setPaint(theme.colour(Tone.SIGMA));
            pieces.forEach(piece -> graphics.fill(band(places, curve, piece[0], piece[1])));
        }
        graphics.setPaint(theme.colour(curve.tone()));
        graphics.setStroke(stroke(curve.tone()));
        for (int[] piece : pieces) {
            Path2D path = new Path2D.Double();
            path.moveTo(places.x(curve.x(piece[0])), places.y(curve.y(piece[0])));
            for (int i = piece[0] + 1; i < piece[1]; i++) {
                path.lineTo(places.x(curve.x(i)), places.y(curve.y(i)));
            }
            if (piece[1] - piece[0] == 1) {
                path.lineTo(places.x(curve.x(piece[0])) + 0.3, places.y(curve.y(piece[0])));
            }
            graphics.draw(path);
        }
    }

    private static BasicStroke stroke(Tone tone) {
        return switch (tone) {
            case LOCUS_VERY_LOW -> dashed(LOCUS_POINT);
            case LOCUS_FIELD -> full(LOCUS_POINT);
            case STANDARD -> dashed(CURVE_POINT);
            default -> full(CURVE_POINT);
        };
    }

    private static BasicStroke full(float width) {
        return new BasicStroke(width, BasicStroke.CAP_ROUND, BasicStroke.JOIN_ROUND);
    }

    /** The band, kept inside the plot: sigmas at the ends of a detector can be huge. */
    private static Shape band(Places places, Curve curve, int from, int to) {
        Path2D path = new Path2D.Double();
        path.moveTo(places.x(curve.x(from)), places.clampedY(curve.high(from)));
        for (int i = from + 1; i < to; i++) {
            path.lineTo(places.x(curve.x(i)), places.clampedY(curve.high(i)));
        }
        for (int i = to - 1; i >= from; i--) {
            path.lineTo(places.x(curve.x(i)), places.clampedY(curve.low(i)));
        }
        path.closePath();
        return path;
    }

    private void draw(Graphics2D graphics, Places places, Layer.Region region) {
        Rectangle2D area = places.area();
        double left = places.clampedX(region.from());
        double right = places.clampedX(region.to());
        double top = area.getMaxY() - region.highShare() * area.getHeight();
        double bottom = area.getMaxY() - region.lowShare() * area.getHeight();
        Rectangle2D box = new Rectangle2D.Double(left, top, right - left, bottom - top);
        graphics.setPaint(theme.colour(region.tone()));
        if (!region.hatched()) {
            graphics.fill(box);
            return;
        }
        graphics.setStroke(fonts.hairline());
        double run = box.getHeight();
        for (double x = left - run; x < right; x += HATCH_STEP) {
            double from = Math.max(left, x);
            double to = Math.min(right, x + run);
            if (from < to) {
                graphics.draw(new Line2D.Double(from, bottom - (from - x), to, bottom - (to - x)));
            }
        }
    }

    private void draw(Graphics2D graphics, Places places, Layer.Area chain) {
        Path2D path = new Path2D.Double();
        Layer.Vertex first = chain.lower().get(0);
        path.moveTo(places.x(first.x()), places.clampedY(first.y()));
        for (Layer.Vertex vertex : chain.lower()) {
            path.lineTo(places.x(vertex.x()), places.clampedY(vertex.y()));
        }
        for (int i = chain.upper().size() - 1; i >= 0; i--) {
            Layer.Vertex vertex = chain.upper().get(i);
            path.lineTo(places.x(vertex.x()), places.clampedY(vertex.y()));
        }
        path.closePath();
        graphics.setPaint(theme.colour(chain.tone()));
        graphics.fill(path);
        graphics.setPaint(theme.quiet());
        graphics.setStroke(new BasicStroke(theme.hairlinePoint() * 0.7f));
        graphics.draw(path);
    }

    private void draw(Graphics2D graphics, Places places, Layer.Interval interval) {
        double left = places.clampedX(interval.from());
        double right = places.clampedX(interval.to());
        double top = places.y(interval.y() + interval.halfHeight());
        double bottom = places.y(interval.y() - interval.halfHeight());
        Rectangle2D box = new Rectangle2D.Double(left, top, right - left, bottom - top);
        graphics.setPaint(theme.colour(interval.tone()));
        graphics.fill(box);
        graphics.setPaint(theme.colour(Tone.RESULT));
        graphics.setStroke(new BasicStroke(theme.hairlinePoint() * 0.8f));
        graphics.draw(box);
    }

    @Override
    public boolean equals(Object other) {
        return this == other;
    }

    @Override
    public int hashCode() {
        return System.identityHashCode(this);
    }
}
