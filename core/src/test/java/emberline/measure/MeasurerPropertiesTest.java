package emberline.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.Feature;
import emberline.catalogue.Form;
import emberline.catalogue.Kind;
import emberline.catalogue.Role;
import emberline.catalogue.Statistic;
import emberline.catalogue.Window;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurement.NotMeasured;
import emberline.measure.Measurement.Why;
import emberline.prepare.PreparedSpectrum;
import emberline.prepare.Preparer;
import emberline.prepare.Preparing;
import emberline.read.Observation;
import emberline.spectrum.Medium;
import emberline.spectrum.Spectrum;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** What must hold for every feature on every spectrum. */
class MeasurerPropertiesTest {

    /** A rough spectrum with structure at all scales, as noise would have. */
    private static Spectrum rough(long seed, double stepMicron, double relativeSigma) {
        Random random = new Random(seed);
        int size = (int) Math.round(1.9 / stepMicron);
        double[] wavelengths = new double[size];
        double[] flux = new double[size];
        double[] sigma = new double[size];
        for (int i = 0; i < size; i++) {
            wavelengths[i] = 0.6 + i * stepMicron;
            flux[i] = 1 + 0.3 * Math.sin(20 * wavelengths[i]) + 0.05 * random.nextGaussian();
            sigma[i] = relativeSigma * flux[i];
        }
        return Spectrum.of(wavelengths, flux, sigma);
    }

    private static void assertSame(
            Measurements expected, Measurements actual, double tolerance, double sigmaFactor) {
        int compared = 0;
        for (FeatureMeasurement one : expected.all()) {
            if (one.result() instanceof Measured value) {
                Measured other = actual.measured(one.feature().id()).orElseThrow();
                assertEquals(
                        value.value(),
                        other.value(),
                        tolerance * Math.max(1, Math.abs(value.value())),
                        one.feature().id());
                assertEquals(
                        value.oneSigma() * sigmaFactor,
                        other.oneSigma(),
                        1e-6 * value.oneSigma() * sigmaFactor + tolerance,
                        one.feature().id());
                compared++;
            }
        }
        assertTrue(compared > 100, compared + " features");
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3})
    void scalingTheFluxChangesNothing(long seed) {
        Spectrum spectrum = rough(seed, 2e-4, 0.02);
        assertSame(
                TestSpectra.measure(TestSpectra.prepared(spectrum, 2000)),
                TestSpectra.measure(TestSpectra.prepared(spectrum.withFluxScaledBy(3.7e-15), 2000)),
                1e-9,
                1);
    }

    @Tag("slow")
    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3})
    void shiftingTheFrameAndBackChangesNothing(long seed) throws Exception {
        Spectrum spectrum = rough(seed, 2e-4, 0.02);
        double kms = 90 * seed;
        double beta = kms / 299_792.458;
        double[] moved = spectrum.wavelengthsMicron();
        for (int i = 0; i < moved.length; i++) {
            moved[i] *= Math.sqrt((1 + beta) / (1 - beta));
        }
        assertSame(
                TestSpectra.measure(preparedAtRest(spectrum, spectrum.wavelengthsMicron(), 0)),
                TestSpectra.measure(preparedAtRest(spectrum, moved, kms)),
                1e-9,
                1);
        Measurements notBack = TestSpectra.measure(preparedAtRest(spectrum, moved, 0));
        String id = "burgasser2006/h2o-j";
        assertNotEquals(
                TestSpectra.value(TestSpectra.measure(TestSpectra.prepared(spectrum, 2000)), id),
                TestSpectra.value(notBack, id),
                1e-6);
    }

    /** Takes a spectrum through the preparing step with a stated velocity. */
    private static PreparedSpectrum preparedAtRest(
            Spectrum spectrum, double[] wavelengths, double kms) throws Exception {
        Observation observation =
                Observation.of(
                        new Observation.Origin("rough.txt", "invented", "00"),
                        wavelengths,
                        spectrum.fluxes(),
                        Optional.of(spectrum.fluxSigmas()),
                        new Observation.Stated(Optional.of(Medium.VACUUM), Optional.empty()),
                        List.of());
        return new Preparer()
                .prepare(
                        observation,
                        Preparing.withDefaults()
                                .withResolvingPower(2000)
                                .withRadialVelocityKms(kms));
    }

    /** Two half pixels of the same flux with root-two times the noise say the same. */
    @ParameterizedTest
    @CsvSource({"1, 180", "2, 180", "1, 2000", "2, 2000", "1, 6000"})
    void splittingEveryPixelChangesNothing(long seed, double resolvingPower) {
        Spectrum spectrum = rough(seed, 2e-4, 0.02);
        int size = spectrum.size();
        double[] wavelengths = new double[2 * size];
        double[] flux = new double[2 * size];
        double[] sigma = new double[2 * size];
        for (int i = 0; i < size; i++) {
            double quarter = (spectrum.highEdgeMicron(i) - spectrum.lowEdgeMicron(i)) / 4;
            for (int k = 0; k < 2; k++) {
                wavelengths[2 * i + k] = spectrum.wavelengthMicron(i) + (2 * k - 1) * quarter;
                flux[2 * i + k] = spectrum.flux(i);
                sigma[2 * i + k] = Math.sqrt(2) * spectrum.fluxSigma(i);
            }
        }
        Measurements whole = TestSpectra.measure(TestSpectra.prepared(spectrum, resolvingPower));
        Measurements halves =
                TestSpectra.measure(
                        TestSpectra.prepared(
                                Spectrum.of(wavelengths, flux, sigma), resolvingPower));
        int compared = 0;
        for (FeatureMeasurement one : whole.all()) {
            // a value at the edge of too noisy may fall to either side
            boolean comparable =
                    one.result() instanceof Measured
                            && halves.measured(one.feature().id()).isPresent()
                            && one.feature().statistic() == Statistic.MEAN;
            if (comparable) {
                Measured value = whole.measured(one.feature().id()).orElseThrow();
                Measured other = halves.measured(one.feature().id()).orElseThrow();
                String id = one.feature().id();
                assertEquals(value.value(), other.value(), 1e-9, id);
                // pixels cut by an edge share their noise less when they are halved: by 15% at
                // most in a window of two pixels
                assertEquals(value.oneSigma(), other.oneSigma(), 0.16 * value.oneSigma(), id);
                compared++;
            }
        }
        assertTrue(compared > 80, compared + " features");
    }

    /** A straight continuum without lines has no equivalent width, with softened windows or not. */
    @ParameterizedTest
    @CsvSource({"1800, 1.2e-4", "2000, 2e-4", "6000, 1e-4", "6000, 0.4e-4"})
    void aStraightContinuumHasNoLines(double resolvingPower, double step) {
        Measurements measured =
                TestSpectra.measure(
                        TestSpectra.of(
                                0.6, 2.5, step, resolvingPower, 0.01, micron -> 3.5 - micron));
        int compared = 0;
        for (FeatureMeasurement one : measured.all()) {
            if (one.feature().kind() == Kind.EQUIVALENT_WIDTH
                    && one.result() instanceof Measured width) {
                // a pixel cut by an edge counts with the flux at its centre
                assertEquals(widthOfNoLine(one.feature()), width.value(), 1e-4, one.feature().id());
                compared++;
            }
        }
        assertTrue(compared > 10, compared + " widths");
    }

    /** On the flux 3.5 less wavelength: a level continuum is that between its side windows. */
    private static double widthOfNoLine(Feature feature) {
        if (feature.form() != Form.EQUIVALENT_WIDTH_MEAN_CONTINUUM) {
            return 0;
        }
        double middle =
                feature.windows().stream()
                        .filter(part -> part.role() != Role.LINE)
                        .mapToDouble(part -> part.window().centreMicron())
                        .average()
                        .orElseThrow();
        Window line = feature.window(Role.LINE);
        return 1e4 * line.widthMicron() * (1 - (3.5 - line.centreMicron()) / (3.5 - middle));
    }

    /** The line cannot be guessed in a gap; beside it the continuum can. */
    @Tag("slow")
    @Test
    void aGapInALineIsRefusedAndOneInItsContinuumIsNot() {
        String id = "lepine2013/ew_halpha";
        Spectrum spectrum = rough(4, 2e-5, 0.02);
        Feature halpha = TestSpectra.CATALOGUE.feature(id).orElseThrow();
        Window line = halpha.window(Role.LINE);
        NotMeasured why =
                assertInstanceOf(
                        NotMeasured.class,
                        withGap(spectrum, line, 0.1).of(id).orElseThrow().result());
        assertEquals(Why.NOT_COVERED, why.why());
        assertTrue(why.detail().contains("97%"), why.detail());
        assertTrue(withGap(spectrum, line, 0.02).measured(id).isPresent());
        Window side = halpha.windows(Role.CONTINUUM_1).get(0).window();
        assertTrue(withGap(spectrum, side, 0.1).measured(id).isPresent());
    }

    /** Measures a spectrum with some share of a window missing. */
    private static Measurements withGap(Spectrum spectrum, Window window, double share) {
        double[] flux = spectrum.fluxes();
        for (int i = 0; i < flux.length; i++) {
            double distance = Math.abs(spectrum.wavelengthMicron(i) - window.centreMicron());
            if (distance < share * window.widthMicron() / 2) {
                flux[i] = Double.NaN;
            }
        }
        return TestSpectra.measure(
                TestSpectra.prepared(spectrum.withFluxes(flux, spectrum.fluxSigmas()), 2000));
    }

    @Test
    void sigmaScalesWithTheNoise() {
        Spectrum spectrum = rough(5, 2e-4, 0.01);
        double[] doubled = spectrum.fluxSigmas();
        for (int i = 0; i < doubled.length; i++) {
            doubled[i] *= 2;
        }
        assertSame(
                TestSpectra.measure(TestSpectra.prepared(spectrum, 2000)),
                TestSpectra.measure(
                        TestSpectra.prepared(
                                spectrum.withFluxes(spectrum.fluxes(), doubled), 2000)),
                1e-9,
                2);
    }

    @Test
    void aGapIsNotCovered() {
        Spectrum spectrum = rough(6, 2e-4, 0.02);
        double[] flux = spectrum.fluxes();
        for (int i = 0; i < flux.length; i++) {
            if (spectrum.wavelengthMicron(i) > 1.14 && spectrum.wavelengthMicron(i) < 1.15) {
                flux[i] = Double.NaN;
            }
        }
        Measurements measured =
                TestSpectra.measure(
                        TestSpectra.prepared(
                                spectrum.withFluxes(flux, spectrum.fluxSigmas()), 2000));
        NotMeasured why =
                assertInstanceOf(
                        NotMeasured.class,
                        measured.of("burgasser2006/h2o-j").orElseThrow().result());
        assertEquals(Why.NOT_COVERED, why.why());
        assertTrue(why.detail().contains("60%"), why.detail());
    }

    @Test
    void lowResolutionRefusesNarrowWindows() {
        PreparedSpectrum coarse =
                TestSpectra.of(0.6, 2.5, 2e-3, 100, 0.01, micron -> 1 + 0.1 * micron);
        Measurements measured = TestSpectra.measure(coarse);
        for (String id : List.of("reid1995/tio5", "allers2013/feh_j", "morelli2020/ew_ki_1.252")) {
            NotMeasured why =
                    assertInstanceOf(NotMeasured.class, measured.of(id).orElseThrow().result());
            assertEquals(Why.TOO_COARSE, why.why(), id);
        }
        assertTrue(measured.measured("burgasser2006/h2o-j").isPresent());
    }

    @Test
    void aContinuumLostInNoiseIsRefused() {
        PreparedSpectrum noisy = TestSpectra.of(0.8, 2.5, 2e-3, 100, 30, micron -> 1);
        for (FeatureMeasurement one : TestSpectra.measure(noisy).all()) {
            assertInstanceOf(NotMeasured.class, one.result(), one.feature().id());
        }
    }

    @Test
    void aNegativeContinuumIsRefused() {
        PreparedSpectrum negative =
                TestSpectra.prepared(
                        Spectrum.of(
                                new double[] {1.0, 1.1, 1.2, 1.3, 1.4},
                                new double[] {-1, -1, -1, -1, -1},
                                new double[] {0.1, 0.1, 0.1, 0.1, 0.1}),
                        10);
        for (FeatureMeasurement one : TestSpectra.measure(negative).all()) {
            assertInstanceOf(NotMeasured.class, one.result(), one.feature().id());
        }
    }

    @Test
    void withoutNoiseThereIsNoValue() {
        PreparedSpectrum silent = TestSpectra.of(0.6, 2.5, 2e-4, 2000, 0, micron -> 1 + micron);
        int unknown = 0;
        for (FeatureMeasurement one : TestSpectra.measure(silent).all()) {
            NotMeasured why = assertInstanceOf(NotMeasured.class, one.result(), one.feature().id());
            unknown += why.why() == Why.NOISE_UNKNOWN ? 1 : 0;
        }
        assertTrue(unknown > 100, unknown + " features");
    }

    /**
     * On a flat flux CaH2 + CaH3 is 2 and the solar TiO5 near 1: the shortfall divides by noise.
     */
    @Tag("slow")
    @Test
    void aShortfallAgainstNothingIsRefused() {
        Window hydrides = new Window(0.6805, 0.7000);
        Measurements deep = TestSpectra.measure(withBand(hydrides, 0.4));
        assertTrue(deep.measured("dhital2012/zeta").isPresent(), "a deep band");
        int refused = 0;
        for (double depth = 0; depth < 0.1; depth += 0.01) {
            NotMeasured why =
                    deepOrNull(TestSpectra.measure(withBand(hydrides, depth)), "dhital2012/zeta");
            if (why != null && why.why() == Why.TOO_NOISY) {
                assertTrue(why.detail().contains("divides by"), why.detail());
                refused++;
            }
        }
        assertTrue(refused > 0, "no shortfall was refused");
    }

    private static NotMeasured deepOrNull(Measurements measured, String id) {
        return measured.of(id).orElseThrow().result().fold(value -> null, why -> why);
    }

    private static PreparedSpectrum withBand(Window window, double depth) {
        return TestSpectra.of(
                0.6,
                0.9,
                1e-4,
                2000,
                0.03,
                micron ->
                        micron > window.lowMicron() && micron < window.highMicron()
                                ? 1 - depth
                                : 1);
    }

    /**
     * On the flux of the wavelength a mean is the centre of its window: a continuum that is
     * interpolated to the line is that of the line, and a normalised difference that of centres.
     */
    @Test
    void onAStraightFluxMeansAreCentres() {
        Measurements measured =
                TestSpectra.measure(TestSpectra.of(0.6, 2.5, 1e-4, 3000, 0.01, micron -> micron));
        int checked = 0;
        for (FeatureMeasurement one : measured.all()) {
            Feature feature = one.feature();
            double expected;
            if (feature.form() == Form.INTERPOLATED_CONTINUUM_OVER_LINE) {
                expected = 1;
            } else if (feature.form() == Form.NORMALISED_DIFFERENCE) {
                double a = feature.windows(Role.BAND_A).get(0).window().centreMicron();
                double b = feature.windows(Role.BAND_B).get(0).window().centreMicron();
                expected = 2 * (a - b) / (a + b);
            } else {
                continue;
            }
            if (one.result() instanceof Measured value) {
                assertEquals(expected, value.value(), 1e-5, feature.id());
                checked++;
            }
        }
        assertTrue(checked >= 3, checked + " features");
    }

    /** One hot pixel moves a mean, not a median. */
    @Test
    void aMedianIgnoresAHotPixel() {
        String id = "canty2013/h2-k";
        Feature feature = TestSpectra.CATALOGUE.feature(id).orElseThrow();
        assertEquals(Statistic.MEDIAN, feature.statistic());
        double centre = feature.windows(Role.NUMERATOR).get(0).window().centreMicron();
        Measurements measured =
                TestSpectra.measure(
                        TestSpectra.of(
                                2.0,
                                2.4,
                                5e-4,
                                2000,
                                0.01,
                                micron -> Math.abs(micron - centre) < 2.6e-4 ? 1000 : 1));
        assertEquals(1, TestSpectra.value(measured, id), 1e-9);
    }
}
