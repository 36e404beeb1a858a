package emberline.measure.line;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.measure.Measurement.Measured;
import emberline.measure.Measurement.NotMeasured;
import emberline.measure.Measurement.Why;
import emberline.measure.Site;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.Spectrum;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class RadialVelocityTest {

    private static final int COPIES = 300;

    private final VelocityFinder finder = new VelocityFinder(InventedLines.CATALOGUE, Site.DRY);

    /**
     * Known velocities come back without bias and with honest errors. Of 300 copies 68.3% should
     * lie within one sigma; three binomial sigmas are 8%. The upper side is open by 3% more,
     * because errors are widened in the one case in twenty in which chance alone scatters the
     * lines; the lower side by 5%, because the error of a fit holds to first order in the noise,
     * and lines of 5 to 10 sigma are not there yet. The bias is to lie within four errors of the
     * mean and a hundredth of a resolution element.
     */
    @Tag("slow")
    @ParameterizedTest
    @CsvSource({
        "1000, 40, 0.4, 60",
        "1000, -90, 0.3, 100",
        "2000, 120, 0.4, 20",
        "2000, -30, 0.3, 50",
        "2000, 0, 0.3, 100",
        "3500, 210, 0.4, 30",
        "6000, -250, 0.4, 20",
        "6000, 15, 0.3, 100",
    })
    void knownVelocitiesComeBackWithHonestErrors(
            double resolvingPower, double kms, double depth, double signalToNoise) {
        double[] pulls = new double[COPIES];
        double sum = 0;
        double sumSigma = 0;
        int found = 0;
        for (int copy = 0; copy < COPIES; copy++) {
            RadialVelocity velocity =
                    finder.find(
                            InventedLines.spectrum(
                                    resolvingPower, kms, depth, signalToNoise, 7919 + copy));
            if (velocity.kms() instanceof Measured measured) {
                pulls[found] = (measured.value() - kms) / measured.oneSigma();
                sum += measured.value() - kms;
                sumSigma += measured.oneSigma();
                found++;
            }
        }
        double within =
                Arrays.stream(pulls, 0, found).filter(pull -> Math.abs(pull) <= 1).count()
                        / (double) found;
        double bias = sum / found;
        double sigma = sumSigma / found;
        String figures =
                String.format(
                        Locale.ROOT,
                        "found %d, bias %.2f km/s, sigma %.2f km/s, within one sigma %.3f",
                        found,
                        bias,
                        sigma,
                        within);
        assertTrue(found >= 0.95 * COPIES, figures);
        assertTrue(within >= 0.683 - 0.08 - 0.05 && within <= 0.683 + 0.08 + 0.03, figures);
        assertTrue(
                Math.abs(bias)
                        <= 4 * sigma / Math.sqrt(found)
                                + 0.01 * FittingLine.elementKms(resolvingPower),
                figures);
    }

    /** A shift by v adds v, up to the pixels that enter and leave the windows. */
    @Test
    void aShiftAddsItsVelocity() {
        PreparedSpectrum still = InventedLines.spectrum(2000, 20, 0.4, 200, 3);
        double before = value(finder.find(still));
        for (double shift : List.of(-180.0, -35.0, 60.0, 240.0)) {
            double beta = shift / 299_792.458;
            double factor = Math.sqrt((1 + beta) / (1 - beta));
            double[] moved = still.spectrum().wavelengthsMicron();
            for (int i = 0; i < moved.length; i++) {
                moved[i] *= factor;
            }
            Spectrum shifted = still.spectrum().withWavelengthsMicron(moved);
            RadialVelocity after = finder.find(InventedLines.prepared(shifted, 2000));
            assertEquals(before + shift, value(after), 1.0, "shift by " + shift);
        }
    }

    /** Scaling flux and noise together changes nothing but rounding. */
    @Test
    void theScaleOfTheFluxDoesNotCount() {
        PreparedSpectrum spectrum = InventedLines.spectrum(2000, 20, 0.4, 60, 4);
        Spectrum scaled = spectrum.spectrum().withFluxScaledBy(3e-15);
        assertEquals(
                value(finder.find(spectrum)),
                value(finder.find(InventedLines.prepared(scaled, 2000))),
                1e-3);
    }

    @Test
    void aSpectrumWithoutLinesHasNoVelocity() {
        int found = 0;
        for (int copy = 0; copy < 50; copy++) {
            RadialVelocity none = finder.find(InventedLines.spectrum(2000, 0, 0, 50, copy));
            found += none.kms() instanceof Measured ? 1 : 0;
        }
        assertEquals(0, found);
        RadialVelocity none = finder.find(InventedLines.spectrum(2000, 0, 0, 50, 1));
        assertEquals(Why.TOO_NOISY, ((NotMeasured) none.kms()).why());
        assertTrue(none.setAside().size() >= 5);
        assertTrue(none.totalSigmaKms().isEmpty());
    }

    @Test
    void aCoarseSpectrumIsRefused() {
        RadialVelocity none = finder.find(InventedLines.spectrum(750, 0, 0.4, 100, 1));
        assertEquals(Why.TOO_COARSE, ((NotMeasured) none.kms()).why());
    }

    /** K I at 1.1773 and 1.1776 micron is a blend at R 2000 and must not give a velocity. */
    @Test
    void blendsAreSetAside() {
        RadialVelocity velocity = finder.find(InventedLines.spectrum(2000, 0, 0.4, 100, 1));
        List<LineSetAside> blends =
                velocity.setAside().stream().filter(l -> l.reason().startsWith("blended")).toList();
        assertEquals(2, blends.size(), blends.toString());
        assertTrue(blends.stream().allMatch(l -> Math.abs(l.restMicron() - 1.1775) < 0.0005));
        assertTrue(
                velocity.used().stream().noneMatch(l -> Math.abs(l.restMicron() - 1.1775) < 5e-4));
        assertTrue(velocity.totalSigmaKms().orElseThrow() > ((Measured) velocity.kms()).oneSigma());
    }

    /** One of six lines displaced by 100 km/s is named and does not move the mean. */
    @Test
    void anOutlierIsSetAside() {
        List<LineVelocity> lines =
                List.of(
                        line(1.1, 11, 4),
                        line(1.2, 8, 3),
                        line(1.3, 13, 5),
                        line(1.4, 9, 4),
                        line(1.5, 10, 2),
                        line(1.6, 110, 3));
        VelocityMean mean = new VelocityMean(lines);
        assertEquals(1, mean.rejected().size());
        assertEquals(1.6, mean.rejected().get(0).restMicron());
        assertEquals(10, mean.mean().value(), 1);
    }

    /**
     * Weighted mean by hand: weights 1/4, 1/16, 1/16, values 0, 4, -2 give (0 + 0.25 - 0.125) /
     * 0.375 = 1/3 and an error of 0.375^-0.5. Where lines scatter far more than their errors say,
     * the error is that of their scatter: for equal errors the root of the variance over the
     * number, by definition of the estimator.
     */
    @Test
    void theMeanIsWeightedAndItsErrorFollowsTheScatter() {
        Measured calm =
                new VelocityMean(List.of(line(1, 0, 2), line(2, 4, 4), line(3, -2, 4))).mean();
        assertEquals(1 / 3.0, calm.value(), 1e-12);
        assertEquals(Math.sqrt(1 / 0.375), calm.oneSigma(), 1e-12);
        Measured wild =
                new VelocityMean(
                                List.of(
                                        line(1, -30, 1),
                                        line(2, 30, 1),
                                        line(3, -30, 1),
                                        line(4, 30, 1)))
                        .mean();
        assertEquals(0, wild.value(), 1e-12);
        assertEquals(Math.sqrt(3600.0 / 3 / 4), wild.oneSigma(), 1e-9);
    }

    /** The reason says how many lines there were, and a twentieth of an element is the scale. */
    @Test
    void whatIsMissingIsCounted() {
        RadialVelocity coarse = finder.find(InventedLines.spectrum(750, 0, 0.4, 100, 1));
        assertEquals(
                "resolving power 750; a velocity needs 1000 or more",
                ((NotMeasured) coarse.kms()).detail());
        assertEquals(299_792.458 / 750 / 20, coarse.scaleSigmaKms(), 1e-6);
        RadialVelocity noisy = finder.find(InventedLines.spectrum(2000, 0, 0, 50, 1));
        assertEquals(
                noisy.used().size() + " lines seen at 5 sigma near one velocity; 3 are needed",
                ((NotMeasured) noisy.kms()).detail());
        assertTrue(
                noisy.setAside().stream().anyMatch(l -> l.reason().contains("5 are needed")),
                noisy.setAside().toString());
        double[] wavelength = new double[200];
        double[] flux = new double[200];
        for (int i = 0; i < 200; i++) {
            wavelength[i] = 1.55 + 1e-4 * i;
            flux[i] = 1;
        }
        RadialVelocity none =
                finder.find(InventedLines.prepared(Spectrum.of(wavelength, flux, flux), 2000));
        NotMeasured why = (NotMeasured) none.kms();
        assertEquals(Why.NOT_COVERED, why.why());
        assertTrue(
                why.detail().matches("[0-2] lines in reach and unblended; 3 are needed"),
                why.detail());
    }

    /**
     * Whether a line is blended depends on the resolution: K I at 1.1773 and 1.1776 is not at 30
     * 000.
     */
    @Test
    void linesArePartedWhereTheResolutionAllows() {
        RadialVelocity fine = finder.find(InventedLines.spectrum(30_000, 12, 0.4, 60, 2));
        assertEquals(12, value(fine), 0.5);
        assertTrue(
                fine.used().stream().anyMatch(l -> Math.abs(l.restMicron() - 1.1773) < 2e-4),
                fine.used().toString());
        LineSetAside blend =
                finder.find(InventedLines.spectrum(2000, 0, 0.4, 100, 1)).setAside().stream()
                        .filter(l -> l.reason().startsWith("blended"))
                        .findFirst()
                        .orElseThrow();
        // 0.0004 micron of 1.1775 are about 100 km/s
        assertTrue(
                blend.reason()
                        .matches(
                                "blended: the nearest line is \\d+ km/s away, one resolution element"
                                        + " is 150 km/s"),
                blend.reason());
    }

    /** The outlier is named with its figures; the median of four lies between the middle two. */
    @Test
    void outliersAreNamedWithTheirFigures() {
        VelocityMean mean =
                new VelocityMean(
                        List.of(
                                line(1.1, 9, 1),
                                line(1.2, 10, 1),
                                line(1.25, 10, 1),
                                line(1.3, 11, 1),
                                line(1.4, 40, 3)));
        assertEquals("outlier: 40 +- 3 km/s, the median is 10", mean.rejected().get(0).reason());
        assertEquals(4, mean.used().size());
        // 4 sigma of the line and the scatter: median 10.5, deviations 1.5, 0.5, 0.5 and 29.5
        VelocityMean near =
                new VelocityMean(
                        List.of(
                                line(1.1, 9, 1),
                                line(1.2, 10, 1),
                                line(1.3, 11, 1),
                                line(1.4, 22, 3)));
        assertEquals(List.of(), near.rejected());
        assertEquals(1, new VelocityMean(List.of(line(1.1, 9, 2))).used().size());
        assertEquals(2, new VelocityMean(List.of(line(1.1, 9, 2))).mean().oneSigma(), 1e-12);
    }

    /**
     * DerSimonian and Laird by hand: values 0, 10, 20 with errors 1, 1, 2, so weights 1, 1, 1/4 and
     * a mean of 15 / 2.25; the common variance follows from the chi-square about it.
     */
    @Test
    void scatterBeyondTheErrorsIsAddedToAll() {
        double mean = 15 / 2.25;
        double chi = mean * mean + (10 - mean) * (10 - mean) + (20 - mean) * (20 - mean) / 4;
        double extra = (chi - 2) / (2.25 - (1 + 1 + 1.0 / 16) / 2.25);
        double w1 = 1 / (1 + extra);
        double w3 = 1 / (4 + extra);
        Measured found =
                new VelocityMean(List.of(line(1, 0, 1), line(2, 10, 1), line(3, 20, 2))).mean();
        assertEquals((10 * w1 + 20 * w3) / (2 * w1 + w3), found.value(), 1e-9);
        assertEquals(1 / Math.sqrt(2 * w1 + w3), found.oneSigma(), 1e-9);
        // two at 1.9 sigma of their difference: chance 5.7%, nothing is added
        Measured chance = new VelocityMean(List.of(line(1, 0, 1), line(2, 2.687, 1))).mean();
        assertEquals(Math.sqrt(0.5), chance.oneSigma(), 1e-9);
    }

    private static LineVelocity line(double micron, double kms, double sigma) {
        return new LineVelocity("K I", micron, kms, sigma, 10);
    }

    private static double value(RadialVelocity velocity) {
        return ((Measured) velocity.kms()).value();
    }
}
