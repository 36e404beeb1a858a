package emberline.reports.chart;

/**
 * The room of a chart inside its axes.
 *
 * @param widthPoint width (point), positive
 * @param heightPoint height (point), positive
 * @param labelSizePoint size of the font of labels (point), positive
 */
public record ChartSize(double widthPoint, double heightPoint, double labelSizePoint) {

    /** Checks that all are positive. */
    public ChartSize {
        if (!(widthPoint > 0 && heightPoint > 0 && labelSizePoint > 0)) {
            throw new IllegalArgumentException(
                    "chart of "
                            + widthPoint
                            + " by "
                            + heightPoint
                            + " point with labels of "
                            + labelSizePoint
                            + ": expected positive numbers");
        }
    }
}
