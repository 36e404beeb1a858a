package emberline.reports.paint;

import emberline.reports.chart.Axis;
import emberline.reports.chart.Axis.Tick;
import java.awt.Graphics2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;
import org.jfree.chart.axis.AxisState;
import org.jfree.chart.axis.NumberAxis;
import org.jfree.chart.axis.NumberTick;
import org.jfree.chart.axis.TickType;
import org.jfree.chart.ui.RectangleEdge;
import org.jfree.chart.ui.TextAnchor;

/** An axis with the ticks of its chart. */
final class TickedAxis extends NumberAxis {

    private static final long serialVersionUID = 1L;

    private final transient Axis axis;

    TickedAxis(Axis axis, Theme theme, ChartFonts fonts) {
        super(axis.title().isEmpty() ? null : axis.title());
        this.axis = axis;
        setRange(axis.low(), axis.high());
        setTickLabelFont(fonts.label());
        setLabelFont(fonts.label());
        setTickLabelPaint(theme.ink());
        setLabelPaint(theme.quiet());
        setAxisLinePaint(theme.ink());
        setTickMarkPaint(theme.ink());
        setAxisLineStroke(fonts.hairline());
        setTickMarkStroke(fonts.hairline());
        setTickMarkInsideLength(3f);
        setTickMarkOutsideLength(0f);
        setMinorTickMarkInsideLength(1.6f);
        setMinorTickMarkOutsideLength(0f);
        setMinorTickMarksVisible(true);
        setTickLabelInsets(new org.jfree.chart.ui.RectangleInsets(2, 3, 1, 3));
        setLabelInsets(new org.jfree.chart.ui.RectangleInsets(3, 1, 0, 1));
    }

    @Override
    public List<NumberTick> refreshTicks(
            Graphics2D graphics, AxisState state, Rectangle2D dataArea, RectangleEdge edge) {
        boolean horizontal = RectangleEdge.isTopOrBottom(edge);
        TextAnchor anchor = horizontal ? TextAnchor.TOP_CENTER : TextAnchor.CENTER_RIGHT;
        List<NumberTick> ticks = new ArrayList<>();
        for (Tick tick : axis.ticks()) {
            ticks.add(
                    new NumberTick(
                            tick.label().isEmpty() ? TickType.MINOR : TickType.MAJOR,
                            tick.at(),
                            tick.label(),
                            anchor,
                            anchor,
                            0));
        }
        return ticks;
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
