package emberline.demo;

import java.util.ArrayList;
import java.util.List;

/** Absolute magnitudes of dwarfs by type and gravity, read from {@code magnitudes.csv}. */
final class AbsoluteMagnitudes {

    private AbsoluteMagnitudes() {}

    /**
     * The absolute magnitude of a dwarf: linear between the rows of its gravity class.
     *
     * @param type type number, M0 = 0
     * @param gravity {@code FLD-G}, {@code INT-G} or {@code VL-G}
     * @param band a column such as {@code j_mag}
     * @return magnitude (Vega); that of the nearest row outside the types of the class
     */
    static double of(double type, String gravity, String band) {
        List<DemoTable.Row> rows = new ArrayList<>();
        for (DemoTable.Row row : DemoTable.named("magnitudes.csv").rows()) {
            if (row.text("gravity").equals(gravity)) {
                rows.add(row);
            }
        }
        DemoTable.Row below = rows.get(0);
        for (DemoTable.Row above : rows) {
            double high = above.number("type_number");
            if (high >= type) {
                double low = below.number("type_number");
                double share = high > low ? Math.max(0, (type - low) / (high - low)) : 0;
                return below.number(band) + share * (above.number(band) - below.number(band));
            }
            below = above;
        }
        return below.number(band);
    }
}
