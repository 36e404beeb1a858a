package emberline.place.calibrated;

import static org.junit.jupiter.api.Assertions.assertEquals;

import emberline.measure.Measurement.Measured;
import emberline.place.GravityClass;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.apache.commons.math3.distribution.MultivariateNormalDistribution;
import org.junit.jupiter.api.Test;

/** The likelihood against the multivariate normal distribution of Commons Math. */
class KnotLikelihoodTest {

    private static final double[][] CORRELATION = {{1, 0.4, -0.2}, {0.4, 1, 0.1}, {-0.2, 0.1, 1}};
    private static final double[] SCATTER = {0.03, 0.05, 0.8};
    private static final double[] NOISE = {0.02, 0.01, 0.3};
    private static final double[] VALUE = {0.91, 1.22, 5.1};

    private static Locus locus(int f) {
        double[] mean = new double[TypeKnots.COUNT];
        double[] shift = new double[TypeKnots.COUNT];
        double[] scatter = new double[TypeKnots.COUNT];
        for (int k = 0; k < TypeKnots.COUNT; k++) {
            mean[k] = mean(f, TypeKnots.typeNumber(k), 0);
            shift[k] = mean(f, TypeKnots.typeNumber(k), 1) - mean[k];
        }
        Arrays.fill(scatter, SCATTER[f]);
        return new Locus("invented/" + f, mean, shift, scatter);
    }

    private static double mean(int f, double type, double lowGravity) {
        return 0.5 + f + (0.04 + 0.1 * f) * type + lowGravity * 0.1 * (f - 1);
    }

    private static Calibration calibration() {
        return new Calibration(
                List.of(locus(0), locus(1), locus(2)), CORRELATION, new LabelError(0.3, 1, 0.1));
    }

    private static Sample sample() {
        Map<String, Measured> values = new LinkedHashMap<>();
        for (int f = 0; f < VALUE.length; f++) {
            values.put("invented/" + f, new Measured(VALUE[f], NOISE[f]));
        }
        return Sample.of(calibration(), values);
    }

    private static double expected(double type, double lowGravity, double spread) {
        return expected(type, lowGravity, spread, new double[] {1, 1, 1});
    }

    /** By the library's multivariate normal density; gravity adds its spread along its shift. */
    private static double expected(
            double type, double lowGravity, double spread, double[] inflation) {
        double[] means = new double[VALUE.length];
        double[][] covariance = new double[VALUE.length][VALUE.length];
        for (int f = 0; f < VALUE.length; f++) {
            means[f] = mean(f, type, lowGravity);
            for (int g = 0; g < VALUE.length; g++) {
                double own = f == g ? NOISE[f] * NOISE[f] : 0;
                double shifts =
                        (mean(f, type, 1) - mean(f, type, 0))
                                * (mean(g, type, 1) - mean(g, type, 0));
                covariance[f][g] =
                        inflation[f]
                                        * inflation[g]
                                        * (CORRELATION[f][g] * SCATTER[f] * SCATTER[g] + own)
                                + spread * spread * shifts;
            }
        }
        return Math.log(new MultivariateNormalDistribution(means, covariance).density(VALUE))
                + VALUE.length / 2.0 * Math.log(2 * Math.PI);
    }

    @Test
    void itIsTheMultivariateNormalDensity() {
        for (int knot : new int[] {3, 20, 40}) {
            KnotLikelihood likelihood = KnotLikelihood.at(sample(), knot);
            for (double steps : new double[] {-1, -0.4, 0, 0.2, 1}) {
                for (GravityClass gravity : GravityClass.values()) {
                    double type = TypeKnots.typeNumber(knot) + steps * TypeKnots.STEP;
                    double log =
                            expected(
                                    type,
                                    GravityScale.centre(gravity),
                                    GravityScale.spread(gravity));
                    assertEquals(
                            log,
                            likelihood.at(steps).logLikelihood(gravity),
                            1e-9 * Math.abs(log) + 1e-9);
                }
            }
        }
    }

    @Test
    void widerSigmasScaleRowsAndColumnsOfTheCovariance() {
        double[] inflation = {1, 3.5, 1.2};
        KnotLikelihood likelihood = KnotLikelihood.at(sample(), 20).widened(inflation);
        for (double steps : new double[] {-0.7, 0, 0.4}) {
            double type = TypeKnots.typeNumber(20) + steps * TypeKnots.STEP;
            assertEquals(
                    expected(type, 0.5, GravityScale.spread(GravityClass.INT_G), inflation),
                    likelihood.at(steps).logLikelihood(GravityClass.INT_G),
                    1e-8);
        }
    }

    /** At the best type of a linear model the pulls balance, and the shares are all of it. */
    @Test
    void pullsBalanceAtTheBestTypeAndSharesAddUp() {
        int knot = 20;
        KnotLikelihood likelihood = KnotLikelihood.at(sample(), knot);
        KnotLikelihood.Pull[] pulls = likelihood.pulls(0, 0);
        double pull = Arrays.stream(pulls).mapToDouble(KnotLikelihood.Pull::subclass).sum();
        double share = Arrays.stream(pulls).mapToDouble(KnotLikelihood.Pull::share).sum();
        assertEquals(1, share, 1e-12);
        double best = TypeKnots.typeNumber(knot) + pull;
        double h = 1e-3;
        assertEquals(0, (expected(best + h, 0, 0) - expected(best - h, 0, 0)) / (2 * h), 1e-5);
    }
}
