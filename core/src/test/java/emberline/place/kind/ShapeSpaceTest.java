package emberline.place.kind;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import java.util.List;
import org.apache.commons.math3.stat.descriptive.rank.Percentile;
import org.apache.commons.math3.stat.descriptive.rank.Percentile.EstimationType;
import org.apache.commons.math3.util.FastMath;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;

/** The space of the product's model, reckoned anew with the functions of Commons Math. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class ShapeSpaceTest {

    private final KindModel model = KindModel.standard().orElseThrow();
    private final ShapeSpace space = ShapeSpace.standard().orElseThrow();
    private final int[] columns = model.kin().columns();

    private double median(int column) {
        double[] values =
                model.kin().rows().stream()
                        .mapToDouble(row -> row.vector().values()[column])
                        .filter(Double::isFinite)
                        .toArray();
        return new Percentile().withEstimationType(EstimationType.R_1).evaluate(values, 50.0001);
    }

    @Test
    void referencesAreThoseOfTheModel() {
        List<ShapeSpace.Reference> references = space.references();
        assertEquals(columns.length, space.size());
        assertEquals(model.kin().rows().size(), references.size());
        for (int k = 0; k < references.size(); k++) {
            ReferenceKin kin = model.kin().rows().get(k);
            assertEquals(kin.object(), references.get(k).object());
            assertEquals(kin.typeNumber(), references.get(k).typeNumber());
            assertEquals(kin.kind(), references.get(k).kind());
            assertEquals(kin.gravity(), references.get(k).gravity());
            assertEquals(kin.source(), references.get(k).source());
        }
    }

    /** The upper median, where the count is even. */
    @Test
    void coordinatesAreInverseHyperbolicSines() {
        List<ShapeSpace.Reference> references = space.references();
        for (int c = 0; c < columns.length; c++) {
            double unit = 3.0 * model.kin().scatter()[columns[c]];
            double median = median(columns[c]);
            for (int k = 0; k < references.size(); k += 7) {
                FeatureVector vector = model.kin().rows().get(k).vector();
                ShapeVector shape = references.get(k).shape();
                double t = (vector.values()[columns[c]] - median) / unit;
                assertEquals(Double.isFinite(t), shape.has(c));
                if (shape.has(c)) {
                    assertEquals(FastMath.asinh(t), shape.value(c), 1e-9);
                    double back = unit * FastMath.cosh(shape.value(c)) * shape.sigma(c);
                    assertEquals(vector.sigmas()[columns[c]], back, 1e-9 * (1 + back));
                }
            }
        }
    }

    /** Half of the references lie on either side of the origin. */
    @Test
    void theOriginIsTheMedian() {
        for (int c = 0; c < columns.length; c++) {
            int column = c;
            List<Double> values =
                    space.references().stream()
                            .filter(one -> one.shape().has(column))
                            .map(one -> one.shape().value(column))
                            .toList();
            long below = values.stream().filter(value -> value < 0).count();
            long above = values.stream().filter(value -> value > 0).count();
            assertTrue(below <= values.size() / 2 && above <= values.size() / 2, "" + column);
            assertTrue(values.contains(0.0), "the median is one of them");
        }
    }

    @Test
    void aMeasuredSpectrumHasTheCoordinatesOfItsFeatures() {
        Measurements measurements =
                new Measurer(FeatureCatalogue.standard(), Measuring.withDefaults())
                        .measure(InventedSpectra.of(1.4, 1.85, 120, w -> 1 + w, 0.05));
        ShapeVector shape = space.of(measurements);
        FeatureVector vector = model.features().of(measurements);
        assertEquals(columns.length, shape.size());
        assertTrue(shape.present() > 5 && shape.present() < shape.size() / 2, "H only");
        for (int c = 0; c < columns.length; c++) {
            assertEquals(vector.has(columns[c]), shape.has(c));
            if (shape.has(c)) {
                double t =
                        (vector.values()[columns[c]] - median(columns[c]))
                                / (3.0 * model.kin().scatter()[columns[c]]);
                assertEquals(FastMath.asinh(t), shape.value(c), 1e-9);
            }
        }
    }
}
