package emberline.place.standard;

import emberline.read.ProductTable;
import java.util.Collection;
import java.util.Map;
import java.util.NavigableMap;
import java.util.Optional;
import java.util.TreeMap;

/**
 * Whether two standards can shine together as a fit says: their fluxes in J must stand to each
 * other as the absolute magnitudes of their types, within {@value #SIGMAS} times what two objects
 * scatter about the relation.
 */
final class FluxRatio {

    private static final String RESOURCE = "/emberline/place/standard/absolute-j.csv";
    private static final double SIGMAS = 2;

    private FluxRatio() {}

    /** An absolute magnitude in J with its scatter (mag). */
    private record Magnitude(double mag, double scatterMag) {}

    /** The table, read at the first use. */
    private static final class Loaded {
        private static final NavigableMap<Double, Magnitude> TABLE = load();

        private static NavigableMap<Double, Magnitude> load() {
            NavigableMap<Double, Magnitude> table = new TreeMap<>();
            ProductTable.at(RESOURCE)
                    .rows()
                    .forEach(
                            row ->
                                    table.put(
                                            Double.valueOf(row.getField("type_number")),
                                            new Magnitude(
                                                    Double.parseDouble(row.getField("j_mag")),
                                                    Double.parseDouble(
                                                            row.getField("scatter_mag")))));
            return table;
        }
    }

    /** Always true where J is not compared or a type lies outside the relation. */
    static boolean allows(
            StandardLibrary.Level level,
            Collection<Range> ranges,
            int first,
            int second,
            ScaleFit fit) {
        Optional<Magnitude> one = at(level.standard(first).typeNumber());
        Optional<Magnitude> two = at(level.standard(second).typeNumber());
        if (one.isEmpty() || two.isEmpty() || !ranges.contains(Range.J)) {
            return true;
        }
        double fluxes =
                fit.b()
                        * level.binned(second).mean(Range.J)
                        / (fit.a() * level.binned(first).mean(Range.J));
        double fainterMag = two.get().mag() - one.get().mag();
        return Math.abs(-2.5 * Math.log10(fluxes) - fainterMag)
                <= SIGMAS * Math.hypot(one.get().scatterMag(), two.get().scatterMag());
    }

    private static Optional<Magnitude> at(double typeNumber) {
        Map.Entry<Double, Magnitude> below = Loaded.TABLE.floorEntry(typeNumber);
        Map.Entry<Double, Magnitude> above = Loaded.TABLE.ceilingEntry(typeNumber);
        if (below == null || above == null) {
            return Optional.empty();
        }
        double width = above.getKey() - below.getKey();
        double t = width > 0 ? (typeNumber - below.getKey()) / width : 0;
        return Optional.of(
                new Magnitude(
                        (1 - t) * below.getValue().mag() + t * above.getValue().mag(),
                        (1 - t) * below.getValue().scatterMag()
                                + t * above.getValue().scatterMag()));
    }
}
