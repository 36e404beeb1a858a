package emberline.prepare;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.prepare.Degrader.Degraded;
import emberline.read.Observation;
import emberline.read.UnreadableSpectrumException;
import emberline.spectrum.Finding;
import emberline.spectrum.Medium;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class DegraderTest {

    private static final Preparing STATED =
            Preparing.withDefaults().withMedium(Medium.VACUUM).withResolvingPower(3000);

    /** 0.9 to 2.4 micron at three pixels a resolution element of R = 3000. */
    private static Observation observation(
            DoubleUnaryOperator clean, double sigma, boolean withSigma) {
        int size = 8826;
        Random random = new Random(5);
        double[] wavelengths = new double[size];
        double[] flux = new double[size];
        double[] sigmas = new double[size];
        for (int i = 0; i < size; i++) {
            wavelengths[i] = 0.9 * Math.exp(i / 9000.0);
            flux[i] = clean.applyAsDouble(wavelengths[i]) + sigma * random.nextGaussian();
            sigmas[i] = sigma;
        }
        return Observation.of(
                new Observation.Origin("invented.csv", "CSV", "00"),
                wavelengths,
                flux,
                withSigma ? Optional.of(sigmas) : Optional.empty(),
                new Observation.Stated(Optional.of(Medium.VACUUM), Optional.empty()),
                List.of());
    }

    private static Degraded degraded(Observation observation, Degrading how)
            throws UnreadableSpectrumException {
        return new Degrader().degrade(observation, STATED, how, 42);
    }

    private static boolean has(Observation observation, String code) {
        return observation.findings().stream().map(Finding::code).anyMatch(code::equals);
    }

    private static double signal(Observation observation) throws UnreadableSpectrumException {
        return BandSignal.best(new Preparer().prepare(observation, STATED).spectrum())
                .orElseThrow()
                .medianSignalToNoise();
    }

    /** Scatter about one in units of the sigma. */
    private static double scatter(double[] flux, double[] sigma) {
        return Math.sqrt(
                IntStream.range(0, flux.length)
                        .mapToDouble(i -> Math.pow((flux[i] - 1) / sigma[i], 2))
                        .average()
                        .orElseThrow());
    }

    @Test
    void nothingAskedForChangesNothing() throws UnreadableSpectrumException {
        Observation observation = observation(w -> 1, 0.01, true);
        assertSame(observation, degraded(observation, Degrading.none()).observation());
    }

    @Test
    void noiseComesDownToTheSignalAskedForAndIsTrue() throws UnreadableSpectrumException {
        Observation before = observation(w -> 1, 0.01, true);
        Observation after = degraded(before, Degrading.none().toSignalToNoise(20)).observation();
        // the noise moves the median of 8826 ratios by about a hundredth of its scatter of one
        assertEquals(20, signal(after), 0.1);
        assertEquals(1, scatter(after.fluxes(), after.fluxSigmas().orElseThrow()), 0.04);
        assertTrue(has(after, "degraded-noise"));
    }

    /** Fluxes in physical units are tiny. */
    @Test
    void theScaleOfTheFluxDoesNotMatter() throws UnreadableSpectrumException {
        Observation before = observation(w -> 1e-17, 1e-19, true);
        Observation after = degraded(before, Degrading.none().toSignalToNoise(20)).observation();
        assertEquals(20, signal(after), 0.1);
        assertEquals(5e-19, after.fluxSigmas().orElseThrow()[100], 1e-20);
    }

    /** Where the file has no sigma, the noise is estimated from the degraded pixels. */
    @Test
    void noiseIsSeenWhereTheFileStatesNone() throws UnreadableSpectrumException {
        Observation before = observation(w -> 1, 0.01, false);
        Observation after = degraded(before, Degrading.none().toSignalToNoise(20)).observation();
        assertTrue(after.fluxSigmas().isEmpty());
        // noise that is estimated is good to a few tenths at best
        assertEquals(20, signal(after), 4);
    }

    @Test
    void theSameSeedGivesTheSamePixels() throws UnreadableSpectrumException {
        Observation before = observation(w -> 1, 0.01, true);
        Degrading how = Degrading.none().toSignalToNoise(20);
        double[] one = degraded(before, how).observation().fluxes();
        assertArrayEquals(one, degraded(before, how).observation().fluxes());
        double[] other = new Degrader().degrade(before, STATED, how, 43).observation().fluxes();
        assertFalse(Arrays.equals(one, other));
    }

    @Test
    void nothingIsImproved() throws UnreadableSpectrumException {
        Observation before = observation(w -> 1, 0.1, true);
        Degraded after =
                degraded(before, Degrading.none().toSignalToNoise(50).toResolvingPower(4000));
        assertArrayEquals(before.fluxes(), after.observation().fluxes());
        assertEquals(
                2,
                after.observation().findings().stream()
                        .filter(f -> f.code().equals("degraded-not"))
                        .count());
        assertEquals(OptionalDouble.of(3000), after.stated().resolvingPower());
    }

    /** A Gaussian line of R = 3000 comes out as one of R = 400 with the same area. */
    @Test
    void linesBecomeAsWideAsTheResolutionAskedFor() throws UnreadableSpectrumException {
        double centre = 1.5;
        double sigma = centre / 3000 / 2.3548;
        Observation before =
                observation(
                        w -> 1 - 0.8 * Math.exp(-Math.pow((w - centre) / sigma, 2) / 2), 0, true);
        Degraded after = degraded(before, Degrading.none().toResolvingPower(400));
        double[] w = after.observation().wavelengthsMicron();
        double[] flux = after.observation().fluxes();
        double area = 0;
        double second = 0;
        double first = 0;
        for (int i = 1; i < w.length - 1; i++) {
            if (Math.abs(w[i] - centre) < 0.01) {
                double depth = (1 - flux[i]) * (w[i + 1] - w[i - 1]) / 2;
                area += depth;
                first += depth * (w[i] - centre);
                second += depth * Math.pow(w[i] - centre, 2);
            }
        }
        double mean = first / area;
        double width = Math.sqrt(second / area - mean * mean) * 2.3548;
        // fine pixels of a third of an element add a hundredth of the width in squares
        assertEquals(centre / 400, width, 0.02 * centre / 400);
        assertEquals(0.8 * sigma * Math.sqrt(2 * Math.PI), area, 0.02 * area);
        assertEquals(0, mean, 0.02 * centre / 400);
        assertEquals(OptionalDouble.of(400), after.stated().resolvingPower());
        double step = Math.log(w[w.length - 1] / w[0]) / (w.length - 1);
        assertEquals(1 / 800.0, step, 1e-5);
    }

    @Test
    void noiseIsCarriedThroughSmoothing() throws UnreadableSpectrumException {
        Observation before = observation(w -> 1, 0.05, true);
        Observation after = degraded(before, Degrading.none().toResolvingPower(400)).observation();
        double[] sigma = after.fluxSigmas().orElseThrow();
        assertEquals(1, scatter(after.fluxes(), sigma), 0.08);
        // the noise of about 3.5 sqrt(pi) sigma pixels is averaged
        assertTrue(sigma[500] < 0.02, sigma[500] + "");
    }

    @Test
    void badPixelsDoNotSpread() throws UnreadableSpectrumException {
        Observation before = observation(w -> w > 1.5 && w < 1.5005 ? Double.NaN : 1, 0, true);
        double[] flux =
                degraded(before, Degrading.none().toResolvingPower(100)).observation().fluxes();
        assertTrue(Arrays.stream(flux).allMatch(f -> Math.abs(f - 1) < 1e-9));
        Observation gap = observation(w -> w > 1.5 && w < 1.6 ? Double.NaN : 1, 0, true);
        double[] with =
                degraded(gap, Degrading.none().toResolvingPower(100)).observation().fluxes();
        assertTrue(Arrays.stream(with).anyMatch(Double::isNaN));
    }

    @Test
    void onlyTheBandIsKept() throws UnreadableSpectrumException {
        Observation after =
                degraded(observation(w -> 1, 0.01, true), Degrading.none().toBand(ObservedBand.H))
                        .observation();
        double[] w = after.wavelengthsMicron();
        assertTrue(w[0] >= 1.45 && w[0] < 1.451 && w[w.length - 1] <= 1.80, w[0] + "");
        assertEquals(w.length, after.fluxSigmas().orElseThrow().length);
    }

    @Test
    void aBandThatIsNotThereIsRefused() {
        Observation before = observation(w -> 1, 0.01, true);
        Degrading optical = Degrading.none().toBand(ObservedBand.OPTICAL);
        Observation infrared = cutBelowOne(before);
        String message =
                assertThrows(UnreadableSpectrumException.class, () -> degraded(infrared, optical))
                        .getMessage();
        assertTrue(message.contains("0 pixels in the band optical"), message);
    }

    private static Observation cutBelowOne(Observation from) {
        int first = 0;
        double[] w = from.wavelengthsMicron();
        while (w[first] < 1.01) {
            first++;
        }
        return Observation.of(
                new Observation.Origin("red.csv", "CSV", "00"),
                Arrays.copyOfRange(w, first, w.length),
                Arrays.copyOfRange(from.fluxes(), first, w.length),
                Optional.empty(),
                new Observation.Stated(Optional.empty(), Optional.empty()),
                List.of());
    }

    @Test
    void numbersThatAreNotPositiveAreRefused() {
        assertThrows(IllegalArgumentException.class, () -> Degrading.none().toSignalToNoise(0));
        assertThrows(
                IllegalArgumentException.class,
                () -> Degrading.none().toResolvingPower(Double.NaN));
    }
}
