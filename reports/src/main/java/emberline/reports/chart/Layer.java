package emberline.reports.chart;

import java.util.List;

/** Something drawn in a chart. */
public sealed interface Layer
        permits Curve,
                Layer.Points,
                Layer.Region,
                Layer.Area,
                Layer.Interval,
                Layer.Labels,
                Layer.Note,
                Layer.Segment,
                Layer.Blocks {

    /**
     * Points with errors.
     *
     * @param points the points
     * @param tone what they mean
     * @param filled whether they are drawn full or open
     */
    record Points(List<Point> points, Tone tone, boolean filled) implements Layer {
        /** Copies the list. */
        public Points {
            points = List.copyOf(points);
        }
    }

    /**
     * A point with the ends of its error bars; an end equal to the value draws no bar.
     *
     * @param x horizontal value
     * @param xLow left end of the bar
     * @param xHigh right end of the bar
     * @param y vertical value
     * @param yLow lower end of the bar
     * @param yHigh upper end of the bar
     */
    record Point(double x, double xLow, double xHigh, double y, double yLow, double yHigh) {}

    /**
     * A part of the horizontal axis.
     *
     * @param from start (unit of the axis)
     * @param to end
     * @param lowShare where it begins vertically, as a share of the height from the bottom
     * @param highShare where it ends vertically
     * @param tone what it means
     * @param hatched whether it is hatched instead of filled
     */
    record Region(
            double from, double to, double lowShare, double highShare, Tone tone, boolean hatched)
            implements Layer {}

    /**
     * The area between two chains of straight lines.
     *
     * @param lower the lower chain, left to right
     * @param upper the upper chain, left to right
     * @param tone what it means
     * @param label a word inside it; may be empty
     */
    record Area(List<Vertex> lower, List<Vertex> upper, Tone tone, String label) implements Layer {
        /** Copies the lists. */
        public Area {
            lower = List.copyOf(lower);
            upper = List.copyOf(upper);
        }
    }

    /**
     * A point of a chain.
     *
     * @param x horizontal value
     * @param y vertical value
     */
    record Vertex(double x, double y) {}

    /**
     * A horizontal bar.
     *
     * @param from start (unit of the horizontal axis)
     * @param to end
     * @param y where it stands (unit of the vertical axis)
     * @param halfHeight half its height (unit of the vertical axis)
     * @param tone what it means
     */
    record Interval(double from, double to, double y, double halfHeight, Tone tone)
            implements Layer {}

    /**
     * Labels of bands and lines in rows at the top of the chart.
     *
     * @param labels the labels with their places
     * @param rowHeightPoint height of a row (point)
     */
    record Labels(List<PlacedLabel> labels, double rowHeightPoint) implements Layer {
        /** Copies the list. */
        public Labels {
            labels = List.copyOf(labels);
        }
    }

    /**
     * A word beside a value, its middle at the height of the value.
     *
     * @param x horizontal value
     * @param y vertical value
     * @param text the word
     * @param tone what it means
     * @param side on which side of the value it stands
     */
    record Note(double x, double y, String text, Tone tone, Side side) implements Layer {}

    /** Where a word stands beside a value. */
    enum Side {
        /** It ends left of the value. */
        LEFT,
        /** It begins right of the value. */
        RIGHT,
        /** It begins at the value and stands above it. */
        ABOVE,
        /** It ends at the value and stands above it. */
        ABOVE_LEFT
    }

    /**
     * A straight line.
     *
     * @param fromX horizontal value of its start
     * @param fromY vertical value of its start
     * @param toX horizontal value of its end
     * @param toY vertical value of its end
     * @param tone what it means
     * @param dashed whether it is dashed
     */
    record Segment(double fromX, double fromY, double toX, double toY, Tone tone, boolean dashed)
            implements Layer {}

    /**
     * Rectangles that are filled together, without seams where they touch.
     *
     * @param blocks the rectangles
     * @param tone what they mean
     * @param outlined whether each has an outline
     */
    record Blocks(List<Block> blocks, Tone tone, boolean outlined) implements Layer {
        /** Copies the list. */
        public Blocks {
            blocks = List.copyOf(blocks);
        }
    }

    /**
     * A rectangle.
     *
     * @param left its left side (unit of the horizontal axis)
     * @param right its right side
     * @param bottom its lower side (unit of the vertical axis)
     * @param top its upper side
     */
    record Block(double left, double right, double bottom, double top) {}
}
