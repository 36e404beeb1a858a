package emberline.measure.line;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Kind;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurement.NotMeasured;
import emberline.measure.Measurement.Why;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.measure.Site;
import emberline.measure.line.LineMeasurement.Detection;
import emberline.prepare.PreparedSpectrum;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class LineMeasurementTest {

    private static final FeatureCatalogue CATALOGUE = InventedLines.CATALOGUE;

    /** Three sigma count as seen; emission only where activity makes it. */
    @ParameterizedTest
    @CsvSource({
        "morelli2020/ew_ki_1.252, 3.0, 1.0, ABSORPTION",
        "morelli2020/ew_ki_1.252, 2.9, 1.0, NOT_SEEN",
        "morelli2020/ew_ki_1.252, -9.0, 1.0, NOT_SEEN",
        "emberline2026/ew_lii_0.6708, -0.5, 0.01, NOT_SEEN",
        "lepine2013/ew_halpha, -3.0, 1.0, EMISSION",
        "lepine2013/ew_halpha, -2.9, 1.0, NOT_SEEN",
        "lepine2013/ew_halpha, 0.5, 0.1, ABSORPTION",
        "lepine2013/ew_halpha, 0, 0, NOT_SEEN",
    })
    void threeSigmaInTheExpectedSenseIsSeen(
            String id, double value, double sigma, Detection expected) {
        Feature feature = CATALOGUE.feature(id).orElseThrow();
        LineMeasurement line = LineMeasurement.of(feature, new Measured(value, sigma));
        assertEquals(expected, line.detection());
        assertEquals(
                expected == Detection.NOT_SEEN
                        ? OptionalDouble.of(3 * sigma)
                        : OptionalDouble.empty(),
                line.limit3SigmaAngstrom());
    }

    @Test
    void aWidthThatIsNotMeasuredHasNoVerdict() {
        Feature feature = CATALOGUE.feature("lepine2013/ew_halpha").orElseThrow();
        LineMeasurement line =
                LineMeasurement.of(feature, new NotMeasured(Why.NOT_COVERED, "not there"));
        assertEquals(Detection.NOT_MEASURED, line.detection());
        assertTrue(line.limit3SigmaAngstrom().isEmpty());
    }

    /**
     * A Gaussian of depth d and sigma s has the width d s times the root of 2 pi; the window of K I
     * at 1.2526 holds it whole, the wings of the next line add less than 1%.
     */
    @Test
    void theReportHoldsEveryWidthAndFindsTheLine() {
        PreparedSpectrum prepared = InventedLines.spectrum(2000, 0, 0.4, 1e6, 5);
        Measurements measurements =
                new Measurer(CATALOGUE, Measuring.withDefaults()).measure(prepared);
        LineReport report = new LineReporter(CATALOGUE, Site.DRY).report(prepared, measurements);
        assertEquals(
                CATALOGUE.features().stream()
                        .filter(f -> f.kind() == Kind.EQUIVALENT_WIDTH)
                        .count(),
                report.lines().size());
        LineMeasurement potassium = report.of("morelli2020/ew_ki_1.252").orElseThrow();
        double sigmaAngstrom = 12525.54 / 2000 / 2.3548;
        double expected = 0.4 * sigmaAngstrom * Math.sqrt(2 * Math.PI);
        assertEquals(Detection.ABSORPTION, potassium.detection());
        assertEquals(expected, ((Measured) potassium.ew()).value(), 0.01 * expected);
        assertEquals(
                Detection.NOT_MEASURED,
                report.of("lepine2013/ew_halpha").orElseThrow().detection());
    }
}
