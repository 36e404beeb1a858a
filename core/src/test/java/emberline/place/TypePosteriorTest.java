package emberline.place;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

class TypePosteriorTest {

    private static final int POINTS = 311;

    /** Normal in type, with the same width for all gravity classes. */
    private static TypePosterior normal(double mean, double sigma, double veryLow) {
        Map<GravityClass, double[]> weights = new EnumMap<>(GravityClass.class);
        for (GravityClass gravity : GravityClass.values()) {
            double[] ofClass = new double[POINTS];
            for (int i = 0; i < POINTS; i++) {
                double u = (i * 0.1 - mean) / sigma;
                ofClass[i] = 7 * shareOf(gravity, veryLow) * Math.exp(-u * u / 2);
            }
            weights.put(gravity, ofClass);
        }
        return TypePosterior.of(0, 0.1, weights);
    }

    private static double shareOf(GravityClass gravity, double veryLow) {
        return switch (gravity) {
            case FLD_G -> 1 - veryLow;
            case INT_G -> 0;
            case VL_G -> veryLow;
        };
    }

    @Test
    void aNormalPosteriorHasNormalQuantiles() {
        TypePosterior posterior = normal(13.27, 0.8, 0.25);
        TypeEstimate type = posterior.estimate();
        assertEquals(13.27, type.typeNumber(), 1e-3);
        assertEquals(0.9945 * 0.8, type.sigmaSubclass(), 2e-3); // 16% lies at -0.9945 sigma
        assertEquals(13.27 - 1.95996 * 0.8, type.lo95(), 5e-3);
        assertEquals(13.27 + 1.95996 * 0.8, type.hi95(), 5e-3);
        assertEquals(0.25, posterior.probability(GravityClass.VL_G), 1e-12);
        assertEquals(0, posterior.probability(GravityClass.INT_G), 0);
    }

    @Test
    void probabilitiesAddUpToOne() {
        TypePosterior posterior = normal(5, 2, 0.5);
        double sum = 0;
        for (int i = 0; i < posterior.size(); i++) {
            sum += posterior.probability(i);
            double classes = 0;
            for (GravityClass gravity : GravityClass.values()) {
                classes += posterior.probability(i, gravity);
            }
            assertEquals(posterior.probability(i), classes, 1e-15);
        }
        assertEquals(1, sum, 1e-12);
    }

    @Test
    void aMixtureHasTheMeanOfItsParts() {
        TypePosterior mixture =
                TypePosterior.mixture(
                        List.of(normal(10, 0.5, 1), normal(14, 0.5, 0)), List.of(3.0, 1.0));
        assertEquals(0.75, mixture.probability(GravityClass.VL_G), 1e-12);
        assertEquals(10, mixture.quantile(0.375), 0.01);
        assertEquals(14, mixture.quantile(0.875), 0.01);
    }

    @Test
    void weightsThatCannotBeNormalisedAreRefused() {
        Map<GravityClass, double[]> weights = new EnumMap<>(GravityClass.class);
        for (GravityClass gravity : GravityClass.values()) {
            weights.put(gravity, new double[3]);
        }
        assertThrows(IllegalArgumentException.class, () -> TypePosterior.of(0, 0.1, weights));
        weights.put(GravityClass.INT_G, new double[] {1, 1});
        assertThrows(IllegalArgumentException.class, () -> TypePosterior.of(0, 0.1, weights));
        weights.put(GravityClass.INT_G, new double[] {1, Double.NaN, 1});
        assertThrows(IllegalArgumentException.class, () -> TypePosterior.of(0, 0.1, weights));
    }
}
