package emberline.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.Window;
import emberline.measure.WindowFunctional.Over;
import emberline.prepare.NoiseModel;
import emberline.spectrum.Spectrum;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import org.apache.commons.math3.special.Erf;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

/** Window functionals on ten pixels of 0.1 micron each, from 0.95 to 1.95 micron, by hand. */
class WindowOperatorTest {

    private static final double[] FLUX = {1, 4, 2, 8, 5, 7, 3, 6, 9, 2};
    private static final double[] SIGMA = {0.1, 0.2, 0.3, 0.1, 0.4, 0.2, 0.1, 0.3, 0.2, 0.1};

    private static Spectrum spectrum(double... flux) {
        double[] wavelength = new double[flux.length];
        for (int i = 0; i < flux.length; i++) {
            wavelength[i] = 1 + 0.1 * i;
        }
        return Spectrum.of(wavelength, flux, Arrays.copyOf(SIGMA, flux.length));
    }

    private static WindowFunctional over(Over over, double low, double high) {
        return new WindowFunctional(new Window(low, high), OptionalDouble.empty(), over);
    }

    private static WindowOperator operator(Spectrum spectrum, WindowFunctional... functionals) {
        return WindowOperator.of(spectrum, 50, List.of(functionals));
    }

    private static double value(Spectrum spectrum, WindowFunctional functional) {
        return operator(spectrum, functional).apply(spectrum)[0];
    }

    /** 1.12 to 1.33: 0.03 of pixel 1, all of pixel 2, 0.08 of pixel 3. */
    @Test
    void aMeanTakesPartsOfPixels() {
        assertEquals(
                (0.03 * 4 + 0.1 * 2 + 0.08 * 8) / 0.21,
                value(spectrum(FLUX), over(Over.MEAN, 1.12, 1.33)),
                1e-12);
        assertEquals(
                0.03 * 4 + 0.1 * 2 + 0.08 * 8,
                value(spectrum(FLUX), over(Over.INTEGRAL, 1.12, 1.33)),
                1e-12);
    }

    /** Pixel 2 is bad: the mean is over the rest, the integral goes on as on average. */
    @Test
    void aBadPixelCoversNothing() {
        double[] flux = FLUX.clone();
        flux[2] = Double.NaN;
        Spectrum holed = spectrum(flux);
        double mean = (0.03 * 4 + 0.08 * 8) / 0.11;
        WindowOperator both =
                operator(
                        holed,
                        over(Over.MEAN, 1.12, 1.33),
                        over(Over.INTEGRAL, 1.12, 1.33),
                        over(Over.MEAN, 1.4, 1.6));
        double[] values = both.apply(holed);
        assertEquals(mean, values[0], 1e-12);
        assertEquals(0.21 * mean, values[1], 1e-12);
        assertEquals(0.11 / 0.21, both.coverage(0), 1e-9);
        assertEquals(1, both.coverage(2), 1e-9);
        assertEquals(0.11 / 0.21, both.coverage(new int[] {2, 0}), 1e-9);
        assertEquals(0.11 / 0.21, both.lineCoverage(new int[] {1, 2}), 1e-9);
        assertEquals(1, both.lineCoverage(new int[] {0, 2}), 1e-9);
    }

    /** Off the spectrum nothing is covered and all is zero. */
    @Test
    void aWindowOffTheSpectrumIsZero() {
        Spectrum spectrum = spectrum(FLUX);
        WindowOperator off =
                operator(spectrum, over(Over.MEAN, 0.7, 0.8), over(Over.MEDIAN, 2.1, 2.3));
        assertEquals(0, off.apply(spectrum)[0]);
        assertEquals(0, off.apply(spectrum)[1]);
        assertEquals(0, off.coverage(0));
        assertEquals(0, off.covariance(spectrum, NoiseModel.INDEPENDENT).get(1, 1));
        WindowOperator half = operator(spectrum, over(Over.MEAN, 0.85, 1.05));
        assertEquals(0.5, half.coverage(0), 1e-9);
        assertEquals(1, half.apply(spectrum)[0], 1e-12);
    }

    /** Whole pixels 1 to 4 of fluxes 4, 2, 8, 5: half way between 4 and 5. */
    @Test
    void aMedianIsInterpolatedByWeight() {
        assertEquals(4.5, value(spectrum(FLUX), over(Over.MEDIAN, 1.05, 1.45)), 1e-9);
        assertEquals(4, value(spectrum(FLUX), over(Over.MEDIAN, 1.05, 1.35)), 1e-9);
        // 2 of weight 0.1 has its middle at 0.05, 8 of 0.04 at 0.12; half is 0.07
        assertEquals(
                2 + 6 * 0.02 / 0.07, value(spectrum(FLUX), over(Over.MEDIAN, 1.15, 1.29)), 1e-9);
        assertEquals(8, value(spectrum(FLUX), over(Over.MEDIAN, 1.27, 1.31)), 1e-9);
    }

    /**
     * Moments of a flux of 1 over x from -1 to 1, in half widths of the window: 2/3 and 2/5 for
     * even powers, none for odd ones.
     */
    @ParameterizedTest
    @CsvSource({
        "INTEGRAL, 2",
        "FIRST_MOMENT, 0",
        "SECOND_MOMENT, 0.6666667",
        "THIRD_MOMENT, 0",
        "FOURTH_MOMENT, 0.4"
    })
    void momentsOfAConstantFlux(Over over, double inHalfWidths) {
        Spectrum flat = spectrum(1, 1, 1, 1, 1, 1, 1, 1, 1, 1);
        assertEquals(0.105 * inHalfWidths, value(flat, over(over, 1.12, 1.33)), 1e-8);
    }

    /** One pixel of flux in the window: the integral of x^k over the pixel. */
    @Test
    void momentsAreIntegralsOverThePixels() {
        Spectrum one = spectrum(0, 0, 0, 1, 0, 0, 0, 0, 0, 0);
        // pixel 3 from 1.25 to 1.35 in the window 1.10 to 1.50, x from -0.25 to 0.25
        assertEquals(0, value(one, over(Over.FIRST_MOMENT, 1.10, 1.50)), 1e-12);
        // x from 0.5 to 1 in the window 1.05 to 1.35 about 1.20
        double half = 0.15;
        double low = 1.0 / 3;
        assertEquals(
                half * (1 - low * low) / 2, value(one, over(Over.FIRST_MOMENT, 1.05, 1.35)), 1e-9);
        assertEquals(
                half * (1 - Math.pow(low, 4)) / 4,
                value(one, over(Over.THIRD_MOMENT, 1.05, 1.35)),
                1e-9);
    }

    /** Two overlapping means and a median, against sums over pixels written out. */
    @ParameterizedTest
    @CsvSource({"0, 0", "0.4, 0", "0.3, 0.1", "0, 0.2"})
    void covarianceIsThatOfThePixels(double lag1, double lag2) {
        Spectrum spectrum = spectrum(FLUX);
        WindowOperator operator =
                operator(
                        spectrum,
                        over(Over.MEAN, 1.05, 1.35),
                        over(Over.MEDIAN, 1.25, 1.45),
                        over(Over.MEAN, 1.55, 1.65),
                        over(Over.MEAN, 1.85, 1.95));
        double[][] weight = new double[4][10];
        Arrays.fill(weight[0], 1, 4, 1.0 / 3);
        Arrays.fill(weight[1], 3, 5, 0.5 * Math.sqrt(Math.PI / 2));
        weight[2][6] = 1;
        weight[3][9] = 1;
        double[] correlation = {1, lag1, lag2};
        NoiseModel noise = new NoiseModel(false, 1, lag1, lag2);
        EnvelopeMatrix found = operator.covariance(spectrum, noise);
        OrthogonalFactor.Strip[] vectors = operator.noiseVectors(spectrum, noise);
        for (int a = 0; a < 4; a++) {
            for (int b = 0; b < 4; b++) {
                double expected = 0;
                for (int i = 0; i < 10; i++) {
                    for (int j = Math.max(0, i - 2); j <= Math.min(9, i + 2); j++) {
                        expected +=
                                weight[a][i]
                                        * SIGMA[i]
                                        * weight[b][j]
                                        * SIGMA[j]
                                        * correlation[Math.abs(i - j)];
                    }
                }
                assertEquals(expected, found.get(a, b), 1e-12, a + " and " + b);
                // the factor of the correlation reaches two pixels back, so nearly the same
                assertEquals(expected, vectors[a].times(vectors[b]), 1e-12, "vectors " + a + b);
            }
        }
    }

    /** A softened edge is an error function: the share of a pixel in the window smoothed by it. */
    @ParameterizedTest
    @EnumSource(
            value = Over.class,
            names = {"MEAN", "INTEGRAL"})
    void aSmoothedWindowHasSoftEdges(Over over) {
        int size = 4000;
        double[] wavelength = new double[size];
        double[] flux = new double[size];
        for (int i = 0; i < size; i++) {
            wavelength[i] = 1 + 1e-4 * i;
            flux[i] = wavelength[i] < 1.2 ? 1 : 2;
        }
        Spectrum step = Spectrum.of(wavelength, flux, new double[size]);
        WindowOperator operator =
                WindowOperator.of(
                        step,
                        2000,
                        List.of(
                                new WindowFunctional(
                                        new Window(1.19, 1.2), OptionalDouble.of(200), over)));
        // the smoothed step is 1 + Phi(x / sigma), averaged over 0.01 micron below it
        double sigma = 1.2 * Math.sqrt(1 / 200.0 / 200 - 1 / 2000.0 / 2000) / 2.354820045;
        double mean = 0;
        for (int k = 0; k < 1000; k++) {
            double x = -0.01 + 0.01 * (k + 0.5) / 1000;
            mean += (1.5 + 0.5 * Erf.erf(x / sigma / Math.sqrt(2))) / 1000;
        }
        double width = over == Over.MEAN ? 1 : 0.01;
        assertEquals(mean * width, operator.apply(step)[0], 0.003 * width);
        assertEquals(1, operator.coverage(0), 1e-9);
    }

    @Test
    void smoothingToAFinerSpectrumIsRefused() {
        PixelEdges edges = PixelEdges.of(spectrum(FLUX));
        for (double[] bad : new double[][] {{100, 100}, {100, 200}, {100, 0}}) {
            IllegalArgumentException refused =
                    assertThrows(
                            IllegalArgumentException.class,
                            () -> new SmoothedWindow(edges, new Window(1.1, 1.2), bad[0], bad[1]));
            assertTrue(
                    refused.getMessage().endsWith("expected 0 < to < from"), refused.getMessage());
        }
    }

    /** Edges of pixels lie at 0.95, 1.05, ... 1.95 micron. */
    @Test
    void pixelsAreFoundByTheirEdges() {
        double[] flux = FLUX.clone();
        flux[4] = Double.NaN;
        PixelEdges edges = PixelEdges.of(spectrum(flux));
        assertEquals(0, edges.firstEndingAbove(0.5));
        assertEquals(1, edges.firstEndingAbove(1.06));
        assertEquals(0, edges.firstEndingAbove(1.04));
        assertEquals(9, edges.firstEndingAbove(1.9));
        assertEquals(10, edges.firstEndingAbove(1.96));
        assertEquals(0, edges.firstStartingAtOrAbove(0.5));
        assertEquals(1, edges.firstStartingAtOrAbove(1.04));
        assertEquals(2, edges.firstStartingAtOrAbove(1.06));
        assertEquals(10, edges.firstStartingAtOrAbove(1.86));
        assertEquals(edges.high(3), edges.low(4), 1e-12);
        assertEquals(edges.low(3), edges.low(3) + edges.overlap(3, 0, edges.low(3)));
        assertEquals(0, edges.firstStartingAtOrAbove(edges.low(0)), "at its start");
        assertEquals(1, edges.firstEndingAbove(edges.high(0)), "ends there, not above");
        assertEquals(0.03, edges.overlap(3, 1.32, 2), 1e-9);
        assertEquals(0, edges.overlap(4, 0, 3), "a bad pixel");
        assertEquals(0, edges.overlap(3, 1.5, 1.6));
    }
}
