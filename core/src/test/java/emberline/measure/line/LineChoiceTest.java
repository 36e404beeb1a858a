package emberline.measure.line;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.measure.Measurement.Measured;
import emberline.measure.Site;
import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Which lines can give a velocity, and the first velocity of all together. */
class LineChoiceTest {

    private static final double SPEED_OF_LIGHT_KMS = 299_792.458;
    private static final double NA_1 = 1.1384568;
    private static final double NA_2 = 1.1406901;
    private static final double K_1 = 1.1693404;
    private static final double K_2 = 1.2435646;
    private static final double K_3 = 1.2525537;
    private static final double NA_3 = 1.2682612;

    private static Spectrum flat(double low, double high) {
        return spectrum(low, high, 2e-4, micron -> 1);
    }

    private static Spectrum spectrum(
            double low, double high, double step, DoubleUnaryOperator flux) {
        int size = (int) Math.round((high - low) / step) + 1;
        double[] wavelength = new double[size];
        double[] fluxes = new double[size];
        double[] sigma = new double[size];
        for (int i = 0; i < size; i++) {
            wavelength[i] = low + i * step;
            fluxes[i] = flux.applyAsDouble(wavelength[i]);
            // noise differs from pixel to pixel, so that weights count
            sigma[i] = 0.001 * (1 + 3 * (i % 3));
        }
        return Spectrum.of(wavelength, fluxes, sigma);
    }

    private static LineChoice choice(Site site, Spectrum spectrum, double resolvingPower) {
        return new LineChoice(InventedLines.CATALOGUE, site, spectrum, resolvingPower);
    }

    private static Optional<FittingLine> fitting(LineChoice choice, double micron) {
        return choice.fitting().stream()
                .filter(line -> Math.abs(line.restMicron() - micron) < 1e-4)
                .findFirst();
    }

    private static String reason(LineChoice choice, double micron) {
        return choice.setAside().stream()
                .filter(line -> Math.abs(line.restMicron() - micron) < 1e-4)
                .map(LineSetAside::reason)
                .findFirst()
                .orElse("");
    }

    /** Li I 6707.76 and 6707.91 lie 7 km/s apart: one line at R 2000, a blend at 50 000. */
    @Test
    void linesThatNoSpectrumPartsAreOne() {
        double mean =
                InventedLines.CATALOGUE.restLines().stream()
                        .filter(line -> line.species().equals("Li I"))
                        .mapToDouble(line -> line.vacuumMicron())
                        .average()
                        .orElseThrow();
        LineChoice coarse = choice(Site.SPACE, flat(0.66, 0.69), 2000);
        assertEquals(1, coarse.fitting().size());
        assertEquals(mean, coarse.fitting().get(0).restMicron(), 1e-12);
        assertEquals("Li I", coarse.fitting().get(0).species());
        LineChoice fine = choice(Site.SPACE, flat(0.66, 0.69), 50_000);
        assertEquals(
                List.of(
                        "blended: the nearest line is 7 km/s away, one resolution element is 6 km/s"),
                fine.setAside().stream().map(LineSetAside::reason).distinct().toList());
        assertEquals(2, fine.setAside().size());
    }

    /** Three lines of Ca I between 2.2614 and 2.2633 are one at R 100, at the mean of all three. */
    @Test
    void theMeanIsThatOfAllThatAreOne() {
        LineChoice coarse = choice(Site.SPACE, flat(1.9, 2.5), 100);
        double mean = (2.2614114 + 2.2631137 + 2.2632897) / 3;
        assertTrue(
                coarse.setAside().stream().anyMatch(l -> Math.abs(l.restMicron() - mean) < 1e-9),
                coarse.setAside().toString());
    }

    /** K I 0.7667 lies in O2, Na I 0.819 and 1.14 in water that spoils low sites alone. */
    @Test
    void theAtmosphereSpoilsLinesBySite() {
        Spectrum optical = flat(0.75, 1.3);
        LineChoice dry = choice(Site.DRY, optical, 2000);
        assertEquals("in telluric O2", reason(dry, 0.76670));
        assertTrue(fitting(dry, 0.77011).isPresent(), "just beyond the band");
        assertTrue(fitting(dry, 0.8185480).isPresent() && fitting(dry, NA_2).isPresent());
        LineChoice wet = choice(Site.WET, optical, 2000);
        assertEquals("in telluric H2O", reason(wet, 0.8185480));
        assertEquals("in telluric H2O", reason(wet, NA_2));
        assertTrue(fitting(wet, K_1).isPresent(), "the band ends at 1.165");
        assertTrue(fitting(choice(Site.SPACE, optical, 2000), 0.76670).isPresent());
    }

    /** Na I 0.81855 and 0.81971 lie 424 km/s apart: each is fitted on half of that. */
    @Test
    void windowsEndHalfWayToTheNextLine() {
        LineChoice choice = choice(Site.DRY, flat(0.75, 1.3), 2000);
        double square = Math.pow(0.8197064 / 0.8185480, 2);
        double apart = SPEED_OF_LIGHT_KMS * (square - 1) / (square + 1);
        assertEquals(apart / 2, fitting(choice, 0.8185480).orElseThrow().halfWindowKms(), 0.2);
        assertEquals(apart / 2, fitting(choice, 0.8197064).orElseThrow().halfWindowKms(), 0.4);
        FittingLine alone = fitting(choice, K_3).orElseThrow();
        assertEquals(2.5 * SPEED_OF_LIGHT_KMS / 2000, alone.halfWindowKms(), 1e-9);
        assertEquals(SPEED_OF_LIGHT_KMS / 2000, alone.elementKms(), 1e-9);
        assertEquals(
                "blended: the nearest line is 82 km/s away, one resolution element is 150 km/s",
                reason(choice, 1.1772836));
    }

    /**
     * The window, 375 km/s either side of 1.25255, must lie on the spectrum: 1.25099 to 1.25412.
     */
    @Test
    void linesNeedTheirWholeWindow() {
        assertTrue(fitting(choice(Site.DRY, flat(1.2508, 1.27), 2000), K_3).isPresent());
        assertFalse(fitting(choice(Site.DRY, flat(1.2512, 1.27), 2000), K_3).isPresent());
        assertTrue(fitting(choice(Site.DRY, flat(1.24, 1.2544), 2000), K_3).isPresent());
        assertFalse(fitting(choice(Site.DRY, flat(1.24, 1.2540), 2000), K_3).isPresent());
    }

    @Test
    void linesOfActivityAreLookedForInEmission() {
        for (FittingLine line : choice(Site.SPACE, flat(0.64, 1.3), 2000).fitting()) {
            boolean activity = line.species().equals("H I") || line.species().equals("He I");
            assertEquals(activity, line.emits(), line.toString());
        }
    }

    private static double gaussian(double micron, double rest, double kms, double width) {
        double v = SPEED_OF_LIGHT_KMS * Math.log(micron / rest) - kms;
        double z = v / (SPEED_OF_LIGHT_KMS / 2000 / 2.354820045 * width);
        return Math.exp(-z * z / 2);
    }

    private static final double[] LINES = {NA_1, NA_2, K_1, K_2, K_3, NA_3};

    /** Lines at one velocity on a continuum that rises or falls by a tenth over their windows. */
    private static Spectrum shifted(double kms, double depth) {
        Random random = new Random(5);
        return spectrum(
                1.12,
                1.3,
                2e-4,
                micron -> {
                    double flux = 1 + 0.2 * Math.sin(micron * 2 * Math.PI / 0.02);
                    for (double rest : LINES) {
                        flux -= depth * gaussian(micron, rest, kms, 1);
                    }
                    return flux + 0.015 * random.nextGaussian();
                });
    }

    private static List<FittingLine> candidates() {
        return choice(Site.DRY, flat(1.12, 1.3), 2000).fitting();
    }

    /** The search has steps of an eighth of an element, 19 km/s. */
    @ParameterizedTest
    @ValueSource(ints = {-27, -8, 0, 4, 18, 26})
    void theFirstVelocityIsThatOfTheLines(int steps) {
        double kms = steps * SPEED_OF_LIGHT_KMS / 2000 / 8;
        assertEquals(kms, StartVelocity.find(shifted(kms, 0.1), candidates()), 1e-6);
    }

    @Test
    void withoutLinesTheFirstVelocityIsZero() {
        assertEquals(0, StartVelocity.find(shifted(100, 0.1), List.of()));
        // lines in emission, where absorption is looked for, explain nothing at their place
        assertTrue(Math.abs(StartVelocity.find(shifted(100, -0.1), candidates()) - 100) > 60);
    }

    /** One deep feature, 400 km/s from the places of the others, cannot lead them. */
    @Test
    void oneStrongFeatureCannotLead() {
        Spectrum weak = shifted(-60, 0.1);
        double[] flux = weak.fluxes();
        for (int i = 0; i < flux.length; i++) {
            flux[i] -= 0.8 * gaussian(weak.wavelengthMicron(i), K_3, 340, 1);
        }
        Spectrum strong = weak.withFluxes(flux, weak.fluxSigmas());
        assertEquals(-60, StartVelocity.find(strong, candidates()), 25);
    }

    /** Lines by their place: velocity, width and depth of each; emission has a negative depth. */
    private static Spectrum with(Map<Double, double[]> lines) {
        Random random = new Random(6);
        return spectrum(
                1.06,
                1.3,
                1e-4,
                micron -> {
                    double flux = 1 + 0.001 * random.nextGaussian();
                    for (Map.Entry<Double, double[]> line : lines.entrySet()) {
                        double[] v = line.getValue();
                        flux -= v[2] * gaussian(micron, line.getKey(), v[0], v[1]);
                    }
                    return flux;
                });
    }

    private static RadialVelocity found(Map<Double, double[]> lines) {
        return new VelocityFinder(InventedLines.CATALOGUE, Site.DRY)
                .find(InventedLines.prepared(with(lines), 2000));
    }

    private static String why(RadialVelocity velocity, double micron) {
        return velocity.setAside().stream()
                .filter(line -> Math.abs(line.restMicron() - micron) < 1e-4)
                .map(LineSetAside::reason)
                .findFirst()
                .orElse("");
    }

    /** A band 3.6 times as wide and a line 160 km/s away are told from the lines of the object. */
    @Test
    void whatIsNoLineAtTheVelocityIsSetAside() {
        double[] line = {10, 1, 0.3};
        RadialVelocity velocity =
                found(
                        Map.of(
                                NA_1, line,
                                NA_2, line,
                                K_1, line,
                                K_2, new double[] {170, 1, 0.3},
                                K_3, line,
                                NA_3, new double[] {10, 3.6, 0.3}));
        assertEquals(10, ((Measured) velocity.kms()).value(), 0.5);
        assertTrue(
                why(velocity, K_2).matches("its fit at 1[67]\\d km/s is not near the .* together"),
                why(velocity, K_2));
        assertTrue(
                why(velocity, NA_3)
                        .matches("3\\.\\d times as wide as an unresolved line; expected 0.5 to 3"),
                why(velocity, NA_3));
        assertEquals(4, velocity.used().size());
    }

    /** Pa beta and He I count in emission, and not in absorption. */
    @Test
    void activityCountsInEmissionAlone() {
        double paschen =
                InventedLines.CATALOGUE.restLines().stream()
                        .filter(l -> l.species().equals("H I"))
                        .mapToDouble(l -> l.vacuumMicron())
                        .filter(micron -> micron > 1.2 && micron < 1.3)
                        .findFirst()
                        .orElseThrow();
        double[] line = {25, 1, 0.3};
        RadialVelocity emits =
                found(
                        Map.of(
                                NA_1, line,
                                NA_2, line,
                                K_1, line,
                                K_2, line,
                                paschen, new double[] {25, 1, -0.3}));
        assertTrue(
                emits.used().stream().anyMatch(l -> l.species().equals("H I") && l.signal() > 5),
                emits.used().toString());
        List<Double> all = new ArrayList<>(List.of(NA_1, NA_2, K_1, K_2));
        assertEquals(all.size() + 1, emits.used().size());
        RadialVelocity absorbs =
                found(Map.of(NA_1, line, NA_2, line, K_1, line, K_2, line, paschen, line));
        assertTrue(
                why(absorbs, paschen).matches("seen at -\\d+\\.\\d sigma; 5 are needed"),
                why(absorbs, paschen));
    }
}
