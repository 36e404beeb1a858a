package emberline.measure;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements.Interval68;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.ResolvingPower.Basis;
import emberline.spectrum.Spectrum;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import org.apache.commons.math3.stat.correlation.PearsonsCorrelation;
import org.apache.commons.math3.stat.descriptive.moment.Skewness;
import org.apache.commons.math3.stat.descriptive.moment.StandardDeviation;
import org.apache.commons.math3.stat.descriptive.rank.Percentile;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Drawing window means is the same as drawing pixels: the distribution of the features agrees
 * within sampling error. Statistics by Apache Commons Math.
 */
class DrawsTest {

    private static final int DRAWS = 4000;

    /** A ratio, an interpolated continuum, a weighted sum, a product of powers, a width. */
    private static final List<String> FEATURES =
            List.of(
                    "burgasser2006/h2o-j",
                    "allers2013/ki_j",
                    "allers2013/h-cont",
                    "kirkpatrick1999/vo-a-sum",
                    "wilking1999/q",
                    "morelli2020/ew_ki_1.252");

    private static PreparedSpectrum spectrum(double signalToNoise, NoiseModel noise) {
        double step = 1e-3;
        int size = 1900;
        double[] wavelengths = new double[size];
        double[] flux = new double[size];
        double[] sigma = new double[size];
        for (int i = 0; i < size; i++) {
            wavelengths[i] = 0.62 + i * step;
            flux[i] = 1 + 0.3 * Math.sin(9 * wavelengths[i]);
            sigma[i] = flux[i] / signalToNoise;
        }
        return new PreparedSpectrum(
                Spectrum.of(wavelengths, flux, sigma),
                new ResolvingPower(900, Basis.GIVEN),
                noise,
                List.of());
    }

    /** White noise smoothed by 1, 2, 1 over the root of 6: lags 4 / 6 and 1 / 6. */
    private static final NoiseModel SMOOTHED = new NoiseModel(false, 1, 4.0 / 6, 1.0 / 6);

    private static double[] noise(int size, boolean smoothed, Random random) {
        double[] white = new double[size + 2];
        for (int i = 0; i < white.length; i++) {
            white[i] = random.nextGaussian();
        }
        double[] noise = new double[size];
        for (int i = 0; i < size; i++) {
            noise[i] =
                    smoothed
                            ? (white[i] + 2 * white[i + 1] + white[i + 2]) / Math.sqrt(6)
                            : white[i];
        }
        return noise;
    }

    private static double[][] byPixels(PreparedSpectrum prepared, List<String> ids) {
        Measurer measurer =
                new Measurer(
                        TestSpectra.CATALOGUE,
                        Measuring.withDefaults().withLeastContinuumSignal(0));
        Random random = new Random(7);
        double[][] values = new double[ids.size()][DRAWS];
        Spectrum spectrum = prepared.spectrum();
        for (int n = 0; n < DRAWS; n++) {
            double[] flux = spectrum.fluxes();
            double[] noise = noise(flux.length, prepared.noise().equals(SMOOTHED), random);
            for (int i = 0; i < flux.length; i++) {
                flux[i] += spectrum.fluxSigma(i) * noise[i];
            }
            Measurements measured =
                    measurer.measure(
                            new PreparedSpectrum(
                                    spectrum.withFluxes(flux, spectrum.fluxSigmas()),
                                    prepared.resolvingPower(),
                                    prepared.noise(),
                                    List.of()));
            for (int k = 0; k < ids.size(); k++) {
                values[k][n] = TestSpectra.value(measured, ids.get(k));
            }
        }
        return values;
    }

    @Tag("slow")
    @ParameterizedTest
    @CsvSource({"20, false", "5, false", "2, false", "20, true"})
    void drawingWindowMeansIsDrawingPixels(double signalToNoise, boolean smoothed) {
        // at S/N 2 the side windows of a line are too noisy for a continuum
        List<String> features = signalToNoise > 2 ? FEATURES : FEATURES.subList(0, 5);
        PreparedSpectrum prepared =
                spectrum(signalToNoise, smoothed ? SMOOTHED : NoiseModel.INDEPENDENT);
        double[][] pixels = byPixels(prepared, features);
        double[][] means =
                new Measurer(
                                TestSpectra.CATALOGUE,
                                Measuring.withDefaults().withLeastContinuumSignal(0))
                        .measure(prepared)
                        .draws(features, DRAWS, 11);
        for (int k = 0; k < features.size(); k++) {
            String id = features.get(k) + " at S/N " + signalToNoise;
            double sigma = new StandardDeviation().evaluate(pixels[k]);
            // sampling error of a median, a sigma and a skew of 4000 draws, times 4
            double median = 4 * 1.2533 * sigma * Math.sqrt(2.0 / DRAWS);
            assertEquals(median(pixels[k]), median(means[k]), median, id);
            // an interval of 4000 draws is known to 1.5%, to 2.1% where they are mirrored; times 4
            assertEquals(interval(pixels[k]), interval(means[k]), 0.105 * interval(pixels[k]), id);
            if (signalToNoise >= 5) {
                assertEquals(sigma, new StandardDeviation().evaluate(means[k]), 0.07 * sigma, id);
            }
            assertEquals(
                    new Skewness().evaluate(trimmed(pixels[k])),
                    new Skewness().evaluate(trimmed(means[k])),
                    4 * Math.sqrt(2 * 6.0 / DRAWS),
                    id);
        }
        assertEquals(
                correlation(pixels[1], pixels[2]),
                correlation(means[1], means[2]),
                4 * Math.sqrt(2.0 / DRAWS));
    }

    private static double median(double[] values) {
        return new Percentile(50).evaluate(values);
    }

    private static double interval(double[] values) {
        return new Percentile(84).evaluate(values) - new Percentile(16).evaluate(values);
    }

    /** Without the outermost percent, since ratios at S/N 2 have no finite moments. */
    private static double[] trimmed(double[] values) {
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        return Arrays.copyOfRange(sorted, sorted.length / 200, sorted.length - sorted.length / 200);
    }

    private static double correlation(double[] a, double[] b) {
        return new PearsonsCorrelation().correlation(a, b);
    }

    @Test
    void sigmaAndCovarianceAreThoseOfTheDraws() {
        Measurements measured = TestSpectra.measure(spectrum(50, NoiseModel.INDEPENDENT));
        List<String> ids = List.of("burgasser2006/h2o-j", "burgasser2006/ch4-j");
        double[][] draws = measured.draws(ids, 20_000, 3);
        Measured one = measured.measured(ids.get(0)).orElseThrow();
        assertEquals(
                new StandardDeviation().evaluate(draws[0]), one.oneSigma(), 0.03 * one.oneSigma());
        double other = measured.measured(ids.get(1)).orElseThrow().oneSigma();
        assertEquals(
                correlation(draws[0], draws[1]),
                measured.covariance(ids.get(0), ids.get(1)) / (one.oneSigma() * other),
                0.03);
    }

    /** With neighbours that share noise, the noise of a wide mean grows by 1 + 2 (r1 + r2). */
    @Test
    void sharedNoiseIsCarried() {
        String id = "burgasser2006/h2o-j";
        Measured alone =
                TestSpectra.measure(spectrum(50, NoiseModel.INDEPENDENT))
                        .measured(id)
                        .orElseThrow();
        Measured shared =
                TestSpectra.measure(spectrum(50, new NoiseModel(false, 1, 0.4, 0.1)))
                        .measured(id)
                        .orElseThrow();
        // a window of 25 pixels has 24 neighbours, not 25
        assertEquals(
                Math.sqrt(1 + 2 * (0.4 * 24 + 0.1 * 23) / 25),
                shared.oneSigma() / alone.oneSigma(),
                0.02);
    }

    @Test
    void theSameSeedGivesTheSameDraws() {
        Measurements measured = TestSpectra.measure(spectrum(10, NoiseModel.INDEPENDENT));
        assertArrayEquals(measured.draws(FEATURES, 100, 5)[2], measured.draws(FEATURES, 100, 5)[2]);
    }

    @Test
    void drawsOfWhatWasNotMeasuredAreRefused() {
        Measurements measured = TestSpectra.measure(spectrum(10, NoiseModel.INDEPENDENT));
        assertThrows(
                IllegalArgumentException.class,
                () -> measured.draws(List.of("kirkpatrick1999/no-such"), 10, 1));
    }

    /**
     * A width on too steep a continuum has no value: such draws are left out, or no interval is
     * given.
     */
    @Tag("slow")
    @Test
    void drawsWithoutValueDoNotShiftTheInterval() {
        int given = 0;
        int withheld = 0;
        for (double signalToNoise : new double[] {20, 5, 2, 1}) {
            Measurements measured =
                    new Measurer(
                                    TestSpectra.CATALOGUE,
                                    Measuring.withDefaults().withLeastContinuumSignal(0))
                            .measure(spectrum(signalToNoise, NoiseModel.INDEPENDENT));
            for (FeatureMeasurement one : measured.all()) {
                if (one.result() instanceof Measured
                        && one.continuumSignal() < Measurements.LINEAR) {
                    Optional<Interval68> interval = measured.interval68(one.feature().id(), 1);
                    double lost =
                            Arrays.stream(measured.draws(List.of(one.feature().id()), 1000, 1)[0])
                                            .filter(Double::isNaN)
                                            .count()
                                    / 1000.0;
                    assertEquals(
                            lost <= 0.05, interval.isPresent(), one.feature().id() + " " + lost);
                    interval.ifPresent(i -> assertTrue(i.low() < i.high(), one.toString()));
                    given += interval.isPresent() && lost > 0 ? 1 : 0;
                    withheld += interval.isPresent() ? 0 : 1;
                }
            }
        }
        assertTrue(given > 0 && withheld > 0, given + " given, " + withheld + " withheld");
    }

    /** What a feature gets depends neither on what else is asked nor on how many draws are. */
    @Test
    void drawsOfAFeatureAreItsOwn() {
        Measurements measured = TestSpectra.measure(spectrum(4, NoiseModel.INDEPENDENT));
        double[] among = measured.draws(FEATURES.subList(0, 5), 1000, 1)[2];
        double[] alone = measured.draws(List.of(FEATURES.get(2)), 1000, 1)[0];
        double[] fewer = measured.draws(List.of(FEATURES.get(2)), 333, 1)[0];
        assertArrayEquals(among, alone);
        assertArrayEquals(Arrays.copyOf(among, 333), fewer);
        Map<String, Interval68> all = measured.intervals68(1);
        assertEquals(
                measured.all().stream().filter(m -> m.result() instanceof Measured).count(),
                all.size());
        assertEquals(
                measured.interval68("burgasser2006/h2o-j", 1).orElseThrow(),
                all.get("burgasser2006/h2o-j"));
    }

    /** A formula has two ways to a value, one draw and many: they agree for every feature. */
    @Test
    void drawsOfEveryFeatureLieAroundItsValue() {
        Measurements measured = TestSpectra.measure(spectrum(1e5, NoiseModel.INDEPENDENT));
        List<String> ids =
                measured.all().stream()
                        .filter(m -> m.result() instanceof Measured)
                        .map(m -> m.feature().id())
                        .toList();
        double[][] draws = measured.draws(ids, 1000, 2);
        assertTrue(ids.size() > 100, ids.size() + " features");
        for (int k = 0; k < ids.size(); k++) {
            Measured one = measured.measured(ids.get(k)).orElseThrow();
            double mean = Arrays.stream(draws[k]).average().orElseThrow();
            assertEquals(one.value(), mean, 4.5 * one.oneSigma() / Math.sqrt(1000), ids.get(k));
            assertEquals(
                    one.oneSigma(),
                    new StandardDeviation().evaluate(draws[k]),
                    0.12 * one.oneSigma(),
                    ids.get(k));
        }
    }

    /** Every other block mirrors the one before it; apart from that no draw knows of another. */
    @Test
    void drawsComeInOppositePairsIndependentOfEachOther() {
        Measurements measured = TestSpectra.measure(spectrum(20, NoiseModel.INDEPENDENT));
        int length = FunctionalDraws.BLOCK;
        int size = 100 * length;
        for (double[] draws : measured.draws(FEATURES, 2 * size, 9)) {
            double[] first = new double[size];
            double[] mirrored = new double[size];
            for (int block = 0; block < 100; block++) {
                System.arraycopy(draws, 2 * block * length, first, block * length, length);
                System.arraycopy(draws, (2 * block + 1) * length, mirrored, block * length, length);
            }
            assertTrue(correlation(first, mirrored) < -0.98, "" + correlation(first, mirrored));
            for (int lag : new int[] {1, length, 2 * length}) {
                assertEquals(
                        0,
                        correlation(
                                Arrays.copyOf(first, size - lag),
                                Arrays.copyOfRange(first, lag, size)),
                        4 / Math.sqrt(size));
            }
        }
    }

    /**
     * Below a signal of 15 the interval is that of the draws by rank: the 159th and 842nd of 1000.
     */
    @Test
    void theIntervalOfANoisyContinuumIsThatOfItsDraws() {
        Measurements measured = TestSpectra.measure(spectrum(2, NoiseModel.INDEPENDENT));
        String id = "burgasser2006/h2o-j";
        double signal = measured.of(id).orElseThrow().continuumSignal();
        // 25 pixels of signal-to-noise 2
        assertEquals(10, signal, 1);
        double[] draws = measured.draws(List.of(id), 1000, 4)[0];
        Arrays.sort(draws);
        Interval68 interval = measured.interval68(id, 4).orElseThrow();
        assertEquals(draws[158], interval.low());
        assertEquals(draws[841], interval.high());
        Measured value = measured.measured(id).orElseThrow();
        assertTrue(
                Math.abs(interval.low() - (value.value() - value.oneSigma())) > 1e-4,
                "skewed, so not the symmetric one");
    }

    @Test
    void theCovarianceOfAllIsThatOfEachPair() {
        Measurements measured = TestSpectra.measure(spectrum(20, NoiseModel.INDEPENDENT));
        List<String> ids = FEATURES.subList(0, 4);
        double[][] matrix = measured.covariance(ids);
        for (int a = 0; a < 4; a++) {
            for (int b = 0; b < 4; b++) {
                assertEquals(measured.covariance(ids.get(a), ids.get(b)), matrix[a][b], 1e-15);
            }
            double sigma = measured.measured(ids.get(a)).orElseThrow().oneSigma();
            assertEquals(sigma * sigma, matrix[a][a], 1e-12);
        }
        assertTrue(measured.of("reid1995/no-such").isEmpty());
        assertTrue(measured.measured("reid1995/no-such").isEmpty());
    }
}
