package emberline.reports.chart;

import java.util.List;

/**
 * An axis of a chart.
 *
 * @param quantity what it measures, in words; may be empty
 * @param unit its unit; may be empty
 * @param low value at its start
 * @param high value at its end, greater than {@code low}
 * @param ticks the marked values with their labels
 */
public record Axis(String quantity, String unit, double low, double high, List<Tick> ticks) {

    /**
     * A marked value.
     *
     * @param at the value
     * @param label its label; empty for a small mark without label
     */
    public record Tick(double at, String label) {}

    /** Copies the list and checks the range. */
    public Axis {
        ticks = List.copyOf(ticks);
        if (!(low < high) || Double.isInfinite(low) || Double.isInfinite(high)) {
            throw new IllegalArgumentException(
                    "axis " + quantity + " from " + low + " to " + high + ": expected low < high");
        }
    }

    /**
     * The title of the axis: quantity and unit.
     *
     * @return for instance {@code Wavelength (µm)}
     */
    public String title() {
        return unit.isEmpty() ? quantity : quantity + " (" + unit + ")";
    }
}
