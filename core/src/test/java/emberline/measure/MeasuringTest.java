package emberline.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureWindow;
import emberline.catalogue.Kind;
import emberline.catalogue.Role;
import emberline.catalogue.TelluricRegion.Strength;
import emberline.catalogue.Window;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurement.NotMeasured;
import emberline.measure.Measurement.Why;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.ResolvingPower.Basis;
import emberline.spectrum.Spectrum;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Settings, and what can be measured at all. */
class MeasuringTest {

    private static final String H2O_J = "burgasser2006/h2o-j";

    @Test
    void settingsAreChecked() {
        Measuring defaults = Measuring.withDefaults();
        assertEquals(new Measuring(0.8, 3, Site.DRY), defaults);
        assertEquals(1, defaults.withMinCoverage(1).minCoverage());
        assertEquals(0, defaults.withLeastContinuumSignal(0).leastContinuumSignal());
        assertEquals(new Measuring(0.8, 3, Site.WET), defaults.withSite(Site.WET));
        for (double coverage : new double[] {0, 1.01, Double.NaN}) {
            IllegalArgumentException refused =
                    assertThrows(
                            IllegalArgumentException.class,
                            () -> defaults.withMinCoverage(coverage));
            assertEquals(
                    "coverage " + coverage + ": expected a share above 0 and up to 1",
                    refused.getMessage());
        }
        IllegalArgumentException signal =
                assertThrows(
                        IllegalArgumentException.class,
                        () -> defaults.withLeastContinuumSignal(-0.1));
        assertEquals("continuum signal -0.1: expected at least 0", signal.getMessage());
    }

    @ParameterizedTest
    @CsvSource({
        "SPACE, OPAQUE, false", "SPACE, WEAK, false", "DRY, OPAQUE, true", "DRY, STRONG, true",
        "DRY, WEAK, false", "WET, OPAQUE, true", "WET, STRONG, true", "WET, WEAK, false"
    })
    void theSiteSaysWhichRegionsSpoil(Site site, Strength strength, boolean spoiled) {
        assertEquals(spoiled, site.isSpoiledBy(strength));
        assertEquals(site.name(), site.word().toUpperCase(java.util.Locale.ROOT));
    }

    @Test
    void aMeasuredValueIsFiniteWithAnError() {
        assertEquals(0, new Measured(1, 0).oneSigma());
        double[][] wrong = {
            {Double.NaN, 1},
            {Double.POSITIVE_INFINITY, 1},
            {1, -0.1},
            {1, Double.NaN},
            {1, Double.POSITIVE_INFINITY}
        };
        for (double[] pair : wrong) {
            IllegalArgumentException refused =
                    assertThrows(
                            IllegalArgumentException.class, () -> new Measured(pair[0], pair[1]));
            assertTrue(refused.getMessage().contains("finite value"), refused.getMessage());
        }
        assertEquals("not covered", Why.NOT_COVERED.words());
        assertEquals("x", new NotMeasured(Why.TELLURIC, "x").fold(v -> "", NotMeasured::detail));
    }

    private static Optional<NotMeasured> refusal(
            String id, double low, double high, double resolvingPower, Basis basis) {
        PreparedSpectrum spectrum =
                TestSpectra.of(low, high, 1e-4, resolvingPower, 0.01, micron -> 1);
        return new Applicability(spectrum.spectrum(), new ResolvingPower(resolvingPower, basis))
                .refusal(feature(id));
    }

    private static Feature feature(String id) {
        return TestSpectra.CATALOGUE.feature(id).orElseThrow();
    }

    /** H2O-J takes 1.140 to 1.165 over 1.260 to 1.285 micron. */
    @Test
    void windowsBeyondTheSpectrumAreNotCovered() {
        NotMeasured short1 = refusal(H2O_J, 1.0, 1.25, 2000, Basis.GIVEN).orElseThrow();
        assertEquals(Why.NOT_COVERED, short1.why());
        assertEquals(
                "window 1.2600 to 1.2850 micron; the spectrum covers 1.0000 to 1.2500",
                short1.detail().replace("0.9999", "1.0000").replace("1.2501", "1.2500"));
        assertEquals(
                Why.NOT_COVERED, refusal(H2O_J, 1.17, 1.4, 2000, Basis.GIVEN).orElseThrow().why());
        assertTrue(refusal(H2O_J, 1.16, 1.27, 2000, Basis.GIVEN).isEmpty(), "reached in part");
    }

    /** H2O-J is printed for R 75 and more; four fifths of that are accepted. */
    @Test
    void fourFifthsOfThePrintedResolvingPowerAreEnough() {
        assertTrue(refusal(H2O_J, 1, 1.4, 60, Basis.GIVEN).isEmpty());
        NotMeasured coarse = refusal(H2O_J, 1, 1.4, 59.6, Basis.GIVEN).orElseThrow();
        assertEquals(Why.TOO_COARSE, coarse.why());
        assertEquals("resolving power 60; the definition needs 75 or more", coarse.detail());
        assertEquals(
                "resolving power 59 (estimated from the sampling); the definition needs 75 or more",
                refusal(H2O_J, 1, 1.4, 59, Basis.SAMPLING).orElseThrow().detail());
    }

    /** The widest resolution element that the documented rule allows a feature, as R. */
    private static double leastResolvingPower(Feature feature) {
        double least = 0;
        for (FeatureWindow part : feature.windows()) {
            boolean line = feature.kind() == Kind.EQUIVALENT_WIDTH && part.role() == Role.LINE;
            boolean smooth =
                    List.of("H2O", "CH4", "CO", "NH3", "H2", "CN", "CONTINUUM")
                            .contains(feature.species());
            double elements = line ? 1 : smooth ? 0.3 : 0.6;
            Window window = part.window();
            least = Math.max(least, elements * window.centreMicron() / window.widthMicron());
        }
        return least;
    }

    /**
     * Lines one element wide, smooth bands 0.3, bands with sharp heads 0.6: just so and not less.
     */
    @Test
    void everyWindowIsAsWideAsItsAbsorberNeeds() {
        Spectrum fine = TestSpectra.of(0.6, 2.5, 2e-5, 1000, 0.01, micron -> 1).spectrum();
        int checked = 0;
        for (Feature feature : TestSpectra.CATALOGUE.features()) {
            double least = leastResolvingPower(feature);
            if (feature.minResolvingPower().isPresent() || least < 1 || least > 8000) {
                continue;
            }
            Optional<NotMeasured> enough = refusalAt(fine, 1.001 * least, feature);
            if (enough.isPresent() && enough.get().why() == Why.NOT_COVERED) {
                continue;
            }
            assertTrue(enough.isEmpty(), feature.id() + ": " + enough);
            NotMeasured coarse = refusalAt(fine, 0.999 * least, feature).orElseThrow();
            assertEquals(Why.TOO_COARSE, coarse.why(), feature.id());
            assertTrue(coarse.detail().startsWith("window of 0."), coarse.detail());
            checked++;
        }
        assertTrue(checked > 10, checked + " features");
        // a resolution element is never finer than a pixel: 0.025 micron by pixels of 0.1
        Spectrum few = TestSpectra.of(1, 1.5, 0.1, 1000, 0.01, micron -> 1).spectrum();
        assertEquals(Why.TOO_COARSE, refusalAt(few, 1000, feature(H2O_J)).orElseThrow().why());
    }

    private static Optional<NotMeasured> refusalAt(
            Spectrum spectrum, double power, Feature feature) {
        return new Applicability(spectrum, new ResolvingPower(power, Basis.GIVEN)).refusal(feature);
    }

    /** A spectrum is smoothed where it is finer than the calibration by more than a tenth. */
    @Test
    void onlyFinerSpectraAreSmoothed() {
        Feature smoothed =
                TestSpectra.CATALOGUE.features().stream()
                        .filter(f -> f.smoothToResolvingPower().isPresent())
                        .findFirst()
                        .orElseThrow();
        double to = smoothed.smoothToResolvingPower().getAsDouble();
        Spectrum spectrum = TestSpectra.of(1, 1.1, 1e-3, to, 0.1, micron -> 1).spectrum();
        assertEquals(OptionalDouble.of(to), smoothing(spectrum, 1.11 * to, smoothed));
        assertEquals(OptionalDouble.empty(), smoothing(spectrum, 1.09 * to, smoothed));
        assertEquals(OptionalDouble.empty(), smoothing(spectrum, 1e6, feature("reid1995/tio5")));
    }

    private static OptionalDouble smoothing(Spectrum spectrum, double power, Feature feature) {
        return new Applicability(spectrum, new ResolvingPower(power, Basis.GIVEN))
                .smoothing(feature);
    }

    private static PreparedSpectrum wide() {
        return TestSpectra.of(0.9, 2.45, 1e-3, 750, 0.01, micron -> 1 + 0.2 * Math.sin(9 * micron));
    }

    /** Fluxes of any scale a number can hold give the same values: the scale is a power of two. */
    @ParameterizedTest
    @CsvSource({"300", "150", "-150", "-300", "-30"})
    void fluxesOfAnySizeGiveTheSameValues(int decimal) {
        PreparedSpectrum plain = wide();
        Measured expected = TestSpectra.measure(plain).measured(H2O_J).orElseThrow();
        Measured scaled =
                TestSpectra.measure(
                                TestSpectra.prepared(
                                        plain.spectrum().withFluxScaledBy(Math.pow(10, decimal)),
                                        750))
                        .measured(H2O_J)
                        .orElseThrow();
        assertEquals(expected.value(), scaled.value(), 1e-12);
        assertEquals(expected.oneSigma(), scaled.oneSigma(), 1e-12);
    }

    /** Spectra on one grid share what was prepared; another grid, mask or resolution does not. */
    @Test
    void gridsAreKnownAgain() {
        GridCache cache = new GridCache();
        Spectrum spectrum = wide().spectrum();
        ResolvingPower power = new ResolvingPower(750, Basis.GIVEN);
        Measurer.Plan first = plan();
        assertSame(first, cache.of(spectrum, power, () -> first));
        assertSame(first, cache.of(spectrum.withFluxScaledBy(3), power, MeasuringTest::plan));
        double[] holed = spectrum.fluxes();
        holed[7] = Double.NaN;
        Measurer.Plan second = plan();
        assertSame(
                second,
                cache.of(spectrum.withFluxes(holed, spectrum.fluxSigmas()), power, () -> second));
        Measurer.Plan third = plan();
        assertSame(third, cache.of(spectrum, new ResolvingPower(751, Basis.GIVEN), () -> third));
        double[] moved = spectrum.wavelengthsMicron();
        moved[0] -= 1e-9;
        Measurer.Plan fourth = plan();
        assertSame(fourth, cache.of(spectrum.withWavelengthsMicron(moved), power, () -> fourth));
    }

    private static Measurer.Plan plan() {
        return new Measurer.Plan(null, null, List.of());
    }

    /** What a composite lacks is named; so is what was asked for and not measured. */
    @Test
    void whatIsMissingIsNamed() {
        Measurements measured =
                TestSpectra.measure(TestSpectra.of(0.6, 0.7, 1e-4, 3000, 0.01, micron -> 1));
        Feature sum =
                TestSpectra.CATALOGUE.features().stream()
                        .filter(f -> f.id().equals("kirkpatrick1999/vo-a-sum"))
                        .findFirst()
                        .orElseThrow();
        NotMeasured why = (NotMeasured) measured.of(sum.id()).orElseThrow().result();
        IllegalArgumentException refused =
                assertThrows(
                        IllegalArgumentException.class,
                        () -> measured.covariance(sum.id(), sum.id()));
        assertTrue(
                refused.getMessage()
                        .startsWith("feature " + sum.id() + " was not measured: expected one of ["),
                refused.getMessage());
        assertTrue(why.why() == Why.NOT_COVERED || why.why() == Why.PART_MISSING, why.toString());
        Measurements lateOnly =
                TestSpectra.measure(TestSpectra.of(1.0, 1.3, 1e-3, 750, 0.01, micron -> 1));
        for (FeatureMeasurement one : lateOnly.all()) {
            if (!one.feature().parts().isEmpty()
                    && one.result() instanceof NotMeasured missing
                    && missing.why() == Why.PART_MISSING) {
                String part = one.feature().parts().get(0).feature();
                assertTrue(
                        missing.detail().matches("its part \\S+/\\S+ does not apply"),
                        part + ": " + missing.detail());
            }
        }
    }

    /** Half of the noise known exactly: one, two and three sigma intervals of a good continuum. */
    @Test
    void intervalsOfAGoodContinuumAreSymmetric() {
        Measurements measured = TestSpectra.measure(wide());
        Measured value = measured.measured(H2O_J).orElseThrow();
        Measurements.Interval68 interval = measured.interval68(H2O_J, 1).orElseThrow();
        assertEquals(value.value() - value.oneSigma(), interval.low(), 1e-12);
        assertEquals(value.value() + value.oneSigma(), interval.high(), 1e-12);
        double[][] matrix = measured.covariance(List.of(H2O_J, "burgasser2006/ch4-j"));
        assertEquals(value.oneSigma() * value.oneSigma(), matrix[0][0], 1e-15);
        assertEquals(matrix[0][1], matrix[1][0]);
        assertTrue(matrix[0][1] != 0, "both use the J band");
        assertEquals(NoiseModel.INDEPENDENT, wide().noise());
    }
}
