package emberline.place;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.ResolvingPower.Basis;
import emberline.spectrum.Spectrum;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ActivityJudgeTest {

    private static final FeatureCatalogue CATALOGUE = FeatureCatalogue.standard();
    private static final Measurer MEASURER = new Measurer(CATALOGUE, Measuring.withDefaults());

    private final ActivityJudge judge = new ActivityJudge(CATALOGUE);

    /** A flat spectrum from 0.64 to 0.67 micron with a line at H alpha of some width (angstrom). */
    private static Measurements halpha(double widthAngstrom, double signalToNoise) {
        int pixels = 1501;
        double[] wavelength = new double[pixels];
        double[] flux = new double[pixels];
        double[] sigma = new double[pixels];
        double spread = 1.5e-4;
        double height = -widthAngstrom * 1e-4 / (spread * Math.sqrt(2 * Math.PI));
        for (int i = 0; i < pixels; i++) {
            wavelength[i] = 0.64 + i * 2e-5;
            double z = (wavelength[i] - 0.6564614) / spread;
            flux[i] = 1 + height * Math.exp(-z * z / 2);
            sigma[i] = 1 / signalToNoise;
        }
        return MEASURER.measure(
                new PreparedSpectrum(
                        Spectrum.of(wavelength, flux, sigma),
                        new ResolvingPower(2000, Basis.GIVEN),
                        NoiseModel.INDEPENDENT,
                        List.of()));
    }

    private static ActivityLevel level(Activity activity, String source) {
        return activity.levels().stream()
                .filter(level -> level.source().key().equals(source))
                .findFirst()
                .orElseThrow();
    }

    /**
     * Width of emission (angstrom) at which log L(H alpha) / L(bol) is -3.3, computed apart from
     * the same chi and rounded to 0.1 angstrom. The tolerance is that rounding, 0.05 / 7.5 = 0.003
     * dex, with 0.001 for light of the line beyond its window.
     */
    @ParameterizedTest
    @CsvSource({
        "0, 7.5, douglas2014",
        "1, 8.3, douglas2014",
        "2, 9.5, douglas2014",
        "3, 11.2, douglas2014",
        "4, 14.0, douglas2014",
        "5, 20.2, douglas2014",
        "6, 28.9, douglas2014",
        "7, 41.6, douglas2014",
        "7, 48.75, schmidt2014",
        "8, 117.65, schmidt2014",
        "10, 253.1, schmidt2014",
    })
    void theWidthAtTheSaturationGivesIt(double type, double width, String source) {
        Activity activity = judge.judge(halpha(-width, 500), TypeEstimate.normal(type, 0.1));
        assertEquals(-3.3, level(activity, source).logRatio(), 0.004);
    }

    /**
     * Zapatero Osorio et al. (2002, A&amp;A, Table 3): type, emission width (angstrom), log L(H
     * alpha) / L(bol). Their bolometric method differs: chi lies 0.1 to 0.2 dex higher, and 0.2 dex
     * is the least difference to expect between authors (0.21 with the rounding of the print).
     */
    @ParameterizedTest
    @CsvSource({"3, 3.6, -3.63", "3, 4.0, -3.59", "2, 3.2, -3.66", "4, 14.0, -3.10"})
    void publishedActivityIsMetWithinTheDifferenceOfMethods(
            double type, double width, double published) {
        Activity activity = judge.judge(halpha(-width, 500), TypeEstimate.normal(type, 0.5));
        assertEquals(published, level(activity, "douglas2014").logRatio(), 0.21);
    }

    /** Chi is linear in its logarithm between types: at M4.5 the geometric mean of M4 and M5. */
    @Test
    void chiIsInterpolatedInItsLogarithm() {
        Measurements measurements = halpha(-10, 500);
        double width = -measurements.measured("lepine2013/ew_halpha").orElseThrow().value();
        Activity activity = judge.judge(measurements, TypeEstimate.normal(4.5, 0.5));
        double chi = Math.sqrt(3.5926e-5 * 2.4768e-5);
        assertEquals(Math.log10(chi * width), level(activity, "douglas2014").logRatio(), 1e-9);
        assertEquals(Optional.of("lepine2013/ew_halpha"), activity.line().map(f -> f.id()));
    }

    /**
     * Error by hand at L1 (Schmidt et al. 2014: chi 2.25e-6 +- 0.11e-6, 1.98e-6 at L0, 2.11e-6 at
     * L2) with a type error of one subclass.
     */
    @Test
    void theErrorHoldsWidthTypeAndChi() {
        Measurements measurements = halpha(-8, 20);
        Measured width = measurements.measured("lepine2013/ew_halpha").orElseThrow();
        double byWidth = width.oneSigma() / -width.value() / Math.log(10);
        double byType = (Math.log10(2.11e-6) - Math.log10(1.98e-6)) / 2;
        double byChi = 0.11 / 2.25 / Math.log(10);
        Activity activity = judge.judge(measurements, TypeEstimate.normal(11, 1));
        assertEquals(
                Math.sqrt(byWidth * byWidth + byType * byType + byChi * byChi),
                level(activity, "schmidt2014").sigmaDex().orElseThrow(),
                1e-9);
        assertEquals(1, activity.levels().size(), "chi of Douglas et al. 2014 ends at M9");
    }

    @Test
    void withoutEmissionThereIsALimit() {
        Measurements measurements = halpha(0, 20);
        double sigma = measurements.measured("lepine2013/ew_halpha").orElseThrow().oneSigma();
        Activity activity = judge.judge(measurements, TypeEstimate.normal(5, 0.5));
        ActivityLevel level = level(activity, "douglas2014");
        assertTrue(level.isUpperLimit());
        assertEquals(Math.log10(2.4768e-5 * 3 * sigma), level.logRatio(), 1e-9);
        assertTrue(judge.findings(activity).isEmpty());
    }

    /** A line seen in absorption is not turned into a limit of emission. */
    @Test
    void absorptionGivesNoLimit() {
        Activity activity = judge.judge(halpha(3, 200), TypeEstimate.normal(5, 0.5));
        assertTrue(activity.levels().isEmpty());
        assertTrue(activity.reason().contains("absorption"), activity.reason());
        assertEquals(Optional.of("lepine2013/ew_halpha"), activity.line().map(f -> f.id()));
    }

    @Test
    void whereThereIsNoneTheReasonIsGiven() {
        Activity late = judge.judge(halpha(-5, 100), TypeEstimate.normal(25, 0.5));
        assertTrue(late.levels().isEmpty());
        assertTrue(late.reason().contains("T5"), late.reason());
        PreparedSpectrum red =
                new PreparedSpectrum(
                        Spectrum.of(
                                new double[] {1, 1.1, 1.2},
                                new double[] {1, 1, 1},
                                new double[] {0.1, 0.1, 0.1}),
                        new ResolvingPower(100, Basis.GIVEN),
                        NoiseModel.INDEPENDENT,
                        List.of());
        Activity none = judge.judge(MEASURER.measure(red), TypeEstimate.normal(5, 0.5));
        assertEquals("H alpha was not measured", none.reason());
        assertTrue(none.line().isEmpty());
    }

    /** Above -3.3 the finding names the chi and the limit; below there is none. */
    @Test
    void emissionAboveTheSaturationIsRemarkedOn() {
        Activity strong = judge.judge(halpha(-40, 100), TypeEstimate.normal(5, 0.5));
        assertEquals(1, judge.findings(strong).size());
        assertEquals("halpha-above-saturation", judge.findings(strong).get(0).code());
        Activity weak = judge.judge(halpha(-10, 100), TypeEstimate.normal(5, 0.5));
        assertTrue(judge.findings(weak).isEmpty());
    }
}
