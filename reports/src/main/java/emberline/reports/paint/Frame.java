package emberline.reports.paint;

/**
 * The room around the data area of a chart, for ticks, labels and titles.
 *
 * @param left room at the left (point)
 * @param top room at the top (point)
 * @param right room at the right (point)
 * @param bottom room at the bottom (point)
 */
public record Frame(double left, double top, double right, double bottom) {}
