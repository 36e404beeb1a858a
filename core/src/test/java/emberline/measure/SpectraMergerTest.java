package emberline.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.Feature;
import emberline.measure.Measurement.Measured;
import emberline.spectrum.Spectrum;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Random;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/** Several spectra of one object become one set of measurements. */
class SpectraMergerTest {

    private static final String H2O_H = "burgasser2006/h2o-h";
    private static final String H2O_J = "burgasser2006/h2o-j";

    /** A spectrum with bands, with drawn noise of a share of its flux. */
    private static Measurements noisy(
            double low, double high, double share, long seed, double tilt) {
        Random random = new Random(seed);
        int size = (int) Math.round((high - low) / 0.001) + 1;
        double[] wavelength = new double[size];
        double[] flux = new double[size];
        double[] sigma = new double[size];
        for (int i = 0; i < size; i++) {
            wavelength[i] = low + i * 0.001;
            double clean = 1 + 0.5 * Math.sin(9 * wavelength[i]) + tilt * (wavelength[i] - 1.5);
            sigma[i] = share * clean;
            flux[i] = clean + sigma[i] * random.nextGaussian();
        }
        return TestSpectra.measure(
                TestSpectra.prepared(Spectrum.of(wavelength, flux, sigma), 1000));
    }

    private static Measurements merged(double calibrationSigma, Measurements... several) {
        return new SpectraMerger(id -> OptionalDouble.of(calibrationSigma))
                .merge(Arrays.asList(several));
    }

    private static Measured measured(Measurements measurements, String id) {
        return measurements.measured(id).orElseThrow();
    }

    @Test
    void anOnlySpectrumStaysAsItIs() {
        Measurements one = noisy(0.9, 2.4, 0.02, 1, 0);
        assertSame(one, merged(0.01, one));
    }

    @Test
    void repeatedFeaturesBecomeTheMeanWeightedByVariance() {
        Measurements one = noisy(0.9, 2.4, 0.02, 1, 0);
        Measurements two = noisy(0.9, 2.4, 0.04, 2, 0);
        Measured a = measured(one, H2O_H);
        Measured b = measured(two, H2O_H);
        Measured both = measured(merged(0, one, two), H2O_H);
        double wa = Math.pow(a.oneSigma(), -2);
        double wb = Math.pow(b.oneSigma(), -2);
        assertEquals((wa * a.value() + wb * b.value()) / (wa + wb), both.value(), 1e-12);
        assertEquals(1 / Math.sqrt(wa + wb), both.oneSigma(), 1e-12);
        // a calibration error far above the noise makes both count alike
        Measured alike = measured(merged(10, one, two), H2O_H);
        assertEquals((a.value() + b.value()) / 2, alike.value(), 1e-5);
        assertEquals(Math.hypot(a.oneSigma(), b.oneSigma()) / 2, alike.oneSigma(), 1e-5);
    }

    @Test
    void covariancesAndDrawsAgree() {
        Measurements one = noisy(0.9, 2.4, 0.03, 1, 0);
        Measurements two = noisy(1.4, 2.4, 0.03, 2, 0);
        Measurements both = merged(0.001, one, two);
        List<String> ids = List.of(H2O_H, H2O_J, "burgasser2006/ch4-h", "burgasser2006/ch4-k");
        double[][] covariance = both.covariance(ids);
        double[][] draws = both.draws(ids, 20_000, 3);
        for (int i = 0; i < ids.size(); i++) {
            assertEquals(
                    Math.pow(measured(both, ids.get(i)).oneSigma(), 2), covariance[i][i], 1e-12);
            for (int j = 0; j < ids.size(); j++) {
                double meanI = Arrays.stream(draws[i]).average().orElseThrow();
                double meanJ = Arrays.stream(draws[j]).average().orElseThrow();
                double sum = 0;
                for (int d = 0; d < draws[i].length; d++) {
                    sum += (draws[i][d] - meanI) * (draws[j][d] - meanJ);
                }
                assertEquals(
                        covariance[i][j],
                        sum / draws[i].length,
                        0.05 * Math.sqrt(covariance[i][i] * covariance[j][j]));
            }
        }
        // H2O-J is seen in the first spectrum alone
        assertEquals(measured(one, H2O_J), measured(both, H2O_J));
    }

    @Tag("slow")
    @Test
    void theErrorOfTheMeanIsThatOfItsSpread() {
        double sum = 0;
        double square = 0;
        double stated = 0;
        int count = 200;
        for (int i = 0; i < count; i++) {
            Measured both =
                    measured(
                            merged(
                                    0,
                                    noisy(1.3, 1.9, 0.05, 2L * i, 0),
                                    noisy(1.3, 1.9, 0.05, 2L * i + 1, 0)),
                            H2O_H);
            sum += both.value();
            square += both.value() * both.value();
            stated += both.oneSigma();
        }
        double spread = Math.sqrt(square / count - Math.pow(sum / count, 2));
        assertEquals(1, spread / (stated / count), 0.15);
    }

    @Test
    void spectraThatContradictEachOtherGetALargerError() {
        Measurements one = noisy(0.9, 2.4, 0.005, 1, 0);
        Measurements tilted = noisy(0.9, 2.4, 0.005, 2, 0.8);
        Measured a = measured(one, H2O_H);
        Measured b = measured(tilted, H2O_H);
        Measurements both = merged(0.001, one, tilted);
        assertTrue(Math.abs(a.value() - b.value()) > 10 * Math.hypot(a.oneSigma(), b.oneSigma()));
        assertTrue(measured(both, H2O_H).oneSigma() > 2 * a.oneSigma());
        assertEquals(
                Math.pow(measured(both, H2O_H).oneSigma(), 2),
                both.covariance(H2O_H, H2O_H),
                1e-12);
        double[] draws = both.draws(List.of(H2O_H), 4000, 5)[0];
        double mean = Arrays.stream(draws).average().orElseThrow();
        assertEquals(measured(both, H2O_H).value(), mean, 0.1 * measured(both, H2O_H).oneSigma());
        // the draws are widened as the error is
        double spread =
                Math.sqrt(
                        Arrays.stream(draws).map(d -> (d - mean) * (d - mean)).sum()
                                / draws.length);
        assertEquals(1, spread / measured(both, H2O_H).oneSigma(), 0.05);
    }

    @Test
    void withoutACalibrationErrorTheBestIsTaken() {
        Measurements one = noisy(0.9, 2.4, 0.05, 1, 0);
        Measurements two = noisy(0.9, 2.4, 0.02, 2, 0);
        Measurements best =
                new SpectraMerger(id -> OptionalDouble.empty()).merge(List.of(one, two));
        assertEquals(measured(two, H2O_H), measured(best, H2O_H));
    }

    private static Measured of(double value, double sigma) {
        return new Measured(value, sigma);
    }

    /** A list of measurements of one feature, by hand, without covariance. */
    private static Measurements single(Measurement result, double signal) {
        Feature feature = TestSpectra.CATALOGUE.feature(H2O_H).orElseThrow();
        FeatureMeasurement one =
                new FeatureMeasurement(feature, result, 1, signal, 0, OptionalDouble.empty());
        return new Measurements(java.util.Map.of(H2O_H, new MeasuredEntry(one, List.of(), 1)));
    }

    /**
     * Three sigma apart is chance, 3.4 is not: values 0 and d with errors of 1 have a chi-square of
     * d^2 / 2, for one degree of freedom; the error of the mean, 0.7071, grows by its root.
     */
    @Test
    void errorsGrowWhereSpectraAreFarApart() {
        Measurements near = merged(0, single(of(0, 1), 50), single(of(4.6, 1), 80));
        assertEquals(2.3, measured(near, H2O_H).value(), 1e-12);
        assertEquals(Math.sqrt(0.5), measured(near, H2O_H).oneSigma(), 1e-12);
        Measurements far = merged(0, single(of(0, 1), 50), single(of(4.8, 1), 80));
        assertEquals(Math.sqrt(0.5) * 4.8 / Math.sqrt(2), measured(far, H2O_H).oneSigma(), 1e-12);
        // three: mean 3, deviations -3, -3, 6: chi-square 54 for two degrees of freedom
        Measurements three =
                merged(0, single(of(0, 1), 50), single(of(0, 1), 80), single(of(9, 1), 20));
        assertEquals(Math.sqrt(27.0 / 3), measured(three, H2O_H).oneSigma(), 1e-12);
        assertEquals(80, three.of(H2O_H).orElseThrow().continuumSignal(), "the best signal");
    }

    /** Weights by noise and calibration: 1 / (9 + 16) and 1 / (0 + 16). */
    @Test
    void calibrationWeighsButDoesNotWiden() {
        Measured both = measured(merged(4, single(of(1, 3), 50), single(of(2, 0), 50)), H2O_H);
        double one = 16.0 / 41;
        assertEquals(one + 2 * (1 - one), both.value(), 1e-12);
        assertEquals(3 * one, both.oneSigma(), 1e-12);
    }

    @Test
    void whatOneSpectrumLacksComesFromTheOther() {
        Measurement none = new Measurement.NotMeasured(Measurement.Why.NOT_COVERED, "gap");
        assertEquals(
                of(2, 0.5), measured(merged(0, single(none, 0), single(of(2, 0.5), 50)), H2O_H));
        Measurements neither = merged(0, single(none, 0), single(none, 0));
        assertEquals(none, neither.of(H2O_H).orElseThrow().result());
    }
}
