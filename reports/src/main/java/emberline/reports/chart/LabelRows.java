package emberline.reports.chart;

import emberline.reports.chart.PlacedLabel.Span;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * Puts labels into rows so that none touches another. Neighbours with the same text that lie closer
 * than their label is wide share one label. Each label goes to the first row with room; where a row
 * limit is reached, what finds no room is left out.
 */
final class LabelRows {

    private final double low;
    private final double high;
    private final double gap;
    private final int mostRows;

    /**
     * Rows along an axis.
     *
     * @param low start of the axis
     * @param high end of the axis
     * @param gap least distance of neighbours (unit of the axis)
     * @param mostRows the most rows
     */
    LabelRows(double low, double high, double gap, int mostRows) {
        this.low = low;
        this.high = high;
        this.gap = gap;
        this.mostRows = mostRows;
    }

    /**
     * Something to be labelled.
     *
     * @param text the label
     * @param width width of the text (unit of the axis)
     * @param spans bands or lines, at least one
     * @param tone band or line
     */
    record Wanted(String text, double width, List<Span> spans, Tone tone) {

        double from() {
            return spans.stream().mapToDouble(Span::from).min().orElseThrow();
        }

        double to() {
            return spans.stream().mapToDouble(Span::to).max().orElseThrow();
        }
    }

    /** Places all, the widest first at equal starts, from left to right. */
    List<PlacedLabel> place(List<Wanted> all) {
        List<Wanted> joined = join(all);
        joined.sort(Comparator.comparingDouble(Wanted::from).thenComparing(Wanted::text));
        List<Double> ends = new ArrayList<>();
        List<PlacedLabel> placed = new ArrayList<>();
        for (Wanted wanted : joined) {
            double centre = centre(wanted);
            double from = Math.min(wanted.from(), centre - wanted.width() / 2);
            double to = Math.max(wanted.to(), centre + wanted.width() / 2);
            int row = 0;
            while (row < ends.size() && ends.get(row) + gap > from) {
                row++;
            }
            if (row == mostRows) {
                continue;
            }
            if (row == ends.size()) {
                ends.add(to);
            } else {
                ends.set(row, to);
            }
            placed.add(new PlacedLabel(wanted.text(), centre, wanted.spans(), row, wanted.tone()));
        }
        return placed;
    }

    /** The middle of the bars, moved inwards where the text would leave the axis. */
    private double centre(Wanted wanted) {
        double middle = (wanted.from() + wanted.to()) / 2;
        double half = wanted.width() / 2 + gap;
        return Math.max(low + half, Math.min(high - half, middle));
    }

    private List<Wanted> join(List<Wanted> all) {
        List<Wanted> sorted = new ArrayList<>(all);
        sorted.sort(Comparator.comparing(Wanted::text).thenComparingDouble(Wanted::from));
        List<Wanted> joined = new ArrayList<>();
        for (Wanted next : sorted) {
            Wanted last = joined.isEmpty() ? null : joined.get(joined.size() - 1);
            boolean near =
                    last != null
                            && last.text().equals(next.text())
                            && centreDistance(last, next) < next.width() + gap;
            if (near) {
                List<Span> spans = new ArrayList<>(last.spans());
                spans.addAll(next.spans());
                joined.set(
                        joined.size() - 1,
                        new Wanted(last.text(), last.width(), spans, last.tone()));
            } else {
                joined.add(next);
            }
        }
        return joined;
    }

    private static double centreDistance(Wanted one, Wanted two) {
        double gapBetween = two.from() - one.to();
        double between = (two.from() + two.to()) / 2 - (one.from() + one.to()) / 2;
        return gapBetween <= 0 ? gapBetween : between;
    }
}
