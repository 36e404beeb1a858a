package emberline.place.calibrated;

import emberline.measure.Measurement.Measured;
import emberline.place.calibrated.TrainingSet.Dwarf;
import emberline.place.reference.ReferenceRow;
import java.util.Arrays;
import java.util.Map;
import java.util.OptionalDouble;

/** Invented dwarfs and loci of which everything is known. */
final class Invented {

    private Invented() {}

    static ReferenceRow row(
            String group, double type, String gravity, String tier, Map<String, Measured> values) {
        return new ReferenceRow(
                group + " spectrum",
                group,
                OptionalDouble.of(type),
                gravity,
                "dwarf",
                tier,
                "invented",
                120,
                OptionalDouble.of(50),
                values);
    }

    static Dwarf dwarf(double type, double weight, Map<String, Measured> values) {
        return new Dwarf(row("one", type, "", "A", values), type, 0, weight);
    }

    /** A locus that runs straight: at M0 the value {@code start}. */
    static Locus locus(String feature, double start, double slope, double shift, double scatter) {
        double[] field = new double[TypeKnots.COUNT];
        double[] shifts = new double[TypeKnots.COUNT];
        double[] scatters = new double[TypeKnots.COUNT];
        Arrays.setAll(field, k -> start + slope * TypeKnots.typeNumber(k));
        Arrays.fill(shifts, shift);
        Arrays.fill(scatters, scatter);
        return new Locus(feature, field, shifts, scatters);
    }
}
