package emberline.reports.chart;

import java.util.List;

/**
 * A label with the bars or ticks below it, and the row in which it stands.
 *
 * @param text the label
 * @param centre where its middle stands (unit of the horizontal axis)
 * @param spans the bands or lines that it names; a line has equal ends
 * @param row row from the top, from 0
 * @param tone band or line
 */
public record PlacedLabel(String text, double centre, List<Span> spans, int row, Tone tone) {

    /**
     * A part of the horizontal axis.
     *
     * @param from start
     * @param to end, not before the start; equal for a line
     */
    public record Span(double from, double to) {}

    /** Copies the list. */
    public PlacedLabel {
        spans = List.copyOf(spans);
    }
}
