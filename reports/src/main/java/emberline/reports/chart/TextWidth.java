package emberline.reports.chart;

/** How wide a text is when it is drawn. */
@FunctionalInterface
public interface TextWidth {

    /**
     * The width of a text.
     *
     * @param text one line
     * @param sizePoint size of the font (point)
     * @return width (point)
     */
    double point(String text, double sizePoint);
}
