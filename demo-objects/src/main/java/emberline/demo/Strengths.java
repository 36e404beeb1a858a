package emberline.demo;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * The strength of every component by spectral type and gravity, read from {@code strengths.csv}.
 * Between types and between gravities it is interpolated linearly; beyond the last type it stays.
 */
final class Strengths {

    /** The row of the temperature of the smooth continuum (K). */
    static final String TEMPERATURE = "teff_k";

    private final double[] types;
    private final Map<String, double[]> field;
    private final Map<String, double[]> veryLow;

    private Strengths(double[] types, Map<String, double[]> field, Map<String, double[]> veryLow) {
        this.types = types;
        this.field = field;
        this.veryLow = veryLow;
    }

    /**
     * Reads the table.
     *
     * @return the strengths
     */
    static Strengths standard() {
        DemoTable table = DemoTable.named("strengths.csv");
        List<String> columns = new ArrayList<>(table.columns());
        columns.removeIf(column -> !column.matches("t\\d+"));
        double[] types =
                columns.stream().mapToDouble(c -> Double.parseDouble(c.substring(1))).toArray();
        Map<String, double[]> field = new LinkedHashMap<>();
        Map<String, double[]> veryLow = new LinkedHashMap<>();
        for (DemoTable.Row row : table.rows()) {
            double[] values = columns.stream().mapToDouble(row::number).toArray();
            boolean low = row.text("gravity").equals("VERY_LOW");
            (low ? veryLow : field).put(row.text("component"), values);
        }
        return new Strengths(types, Map.copyOf(field), Map.copyOf(veryLow));
    }

    /** The components, the temperature of the continuum among them. */
    Set<String> components() {
        return field.keySet();
    }

    /**
     * The strength of a component.
     *
     * @param component one of {@link #components}
     * @param typeNumber type, M0 = 0
     * @param lowGravity 0 for field gravity, 1 for very low gravity, between them for intermediate
     * @return optical depth at the peak, or kelvin for the temperature
     */
    double of(String component, double typeNumber, double lowGravity) {
        double high = interpolate(field.get(component), typeNumber);
        double[] low = veryLow.get(component);
        return low == null
                ? high
                : (1 - lowGravity) * high + lowGravity * interpolate(low, typeNumber);
    }

    private double interpolate(double[] values, double typeNumber) {
        int last = types.length - 1;
        if (typeNumber <= types[0]) {
            return values[0];
        }
        if (typeNumber >= types[last]) {
            return values[last];
        }
        int i = 1;
        while (types[i] < typeNumber) {
            i++;
        }
        double share = (typeNumber - types[i - 1]) / (types[i] - types[i - 1]);
        return values[i - 1] + share * (values[i] - values[i - 1]);
    }
}
