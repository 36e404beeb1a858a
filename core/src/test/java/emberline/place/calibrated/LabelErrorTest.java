package emberline.place.calibrated;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import emberline.place.GravityClass;
import emberline.place.TypePosterior;
import emberline.place.reference.ReferenceRow;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Random;
import org.junit.jupiter.api.Test;

class LabelErrorTest {

    @Test
    void itIsADistribution() {
        LabelError error = new LabelError(0.4, 1.4, 0.2);
        double sum = 0;
        for (int i = -200; i <= 200; i++) {
            sum += error.probability(i * 0.1, 0.1);
        }
        assertEquals(1, sum, 1e-6);
        assertThrows(IllegalArgumentException.class, () -> new LabelError(0, 1, 0.1));
        assertThrows(IllegalArgumentException.class, () -> new LabelError(0.4, 1, 1.1));
    }

    /** Labels that were drawn with a known error: the error is found again. */
    @Test
    void aKnownErrorIsFound() {
        Random random = new Random(3);
        List<LabelFit.Labelled> labelled = new ArrayList<>();
        for (int i = 0; i < 600; i++) {
            double label = 12 + (i % 5 == 0 ? 1.6 : 0.35) * random.nextGaussian();
            labelled.add(
                    new LabelFit.Labelled(
                            sharp(12),
                            label,
                            new ReferenceRow(
                                    "x",
                                    "x",
                                    OptionalDouble.of(label),
                                    "",
                                    "dwarf",
                                    "A",
                                    "",
                                    120,
                                    OptionalDouble.empty(),
                                    Map.of())));
        }
        LabelError found = LabelFit.fit(labelled);
        assertEquals(0.35, found.coreSubclass(), 0.06);
        assertEquals(1.6, found.tailSubclass(), 0.41);
        assertEquals(0.2, found.tailShare(), 0.06);
    }

    private static TypePosterior sharp(double type) {
        Map<GravityClass, double[]> weights = new EnumMap<>(GravityClass.class);
        for (GravityClass gravity : GravityClass.values()) {
            double[] ofClass = new double[311];
            ofClass[(int) Math.round(type * 10)] = 1;
            weights.put(gravity, ofClass);
        }
        return TypePosterior.of(0, 0.1, weights);
    }
}
