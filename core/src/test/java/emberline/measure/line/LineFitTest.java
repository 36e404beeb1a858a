package emberline.measure.line;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.prepare.NoiseModel;
import emberline.spectrum.Spectrum;
import java.util.Arrays;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.DoubleUnaryOperator;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.MatrixUtils;
import org.apache.commons.math3.linear.RealMatrix;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** One line on its segment of a spectrum. */
class LineFitTest {

    private static final double SPEED_OF_LIGHT_KMS = 299_792.458;
    private static final double REST = 1.25;
    private static final double ELEMENT = 150;
    private static final double SIGMA = ELEMENT / 2.354820045;
    private static final double HALF = 375;
    private static final FittingLine LINE = new FittingLine("K I", REST, false, ELEMENT, HALF);
    private static final int PIXELS = 400;
    private static final double NOISE = 0.02;

    /** Pixels a tenth of a resolution element apart, about the line at rest. */
    private static double kms(int pixel) {
        return (pixel - PIXELS / 2 + 0.3) * ELEMENT / 10;
    }

    private static Spectrum spectrum(DoubleUnaryOperator fluxOfKms) {
        double[] wavelength = new double[PIXELS];
        double[] flux = new double[PIXELS];
        double[] sigma = new double[PIXELS];
        for (int i = 0; i < PIXELS; i++) {
            double beta = kms(i) / SPEED_OF_LIGHT_KMS;
            wavelength[i] = REST * Math.sqrt((1 + beta) / (1 - beta));
            flux[i] = fluxOfKms.applyAsDouble(kms(i));
            sigma[i] = NOISE;
        }
        return Spectrum.of(wavelength, flux, sigma);
    }

    private static double model(double[] p, double kms) {
        double z = (kms - p[3]) / (SIGMA * p[4]);
        return p[0] + p[1] * kms / HALF - p[2] * Math.exp(-z * z / 2);
    }

    private static LineFit fit(Spectrum spectrum, NoiseModel noise) {
        LineSegment segment = LineSegment.of(spectrum, LINE, 0).orElseThrow();
        return LineFit.of(segment, LINE, 0, noise).orElseThrow();
    }

    /** Doppler by hand: at 0.1 c the factor is the root of 1.1 over 0.9. */
    @Test
    void velocitiesAreRelativistic() {
        double tenth = 0.1 * SPEED_OF_LIGHT_KMS;
        assertEquals(REST * Math.sqrt(1.1 / 0.9), LINE.receivedMicron(tenth), 1e-12);
        assertEquals(tenth, LINE.velocityKms(REST * Math.sqrt(1.1 / 0.9)), 1e-6);
        assertEquals(-tenth, LINE.velocityKms(REST * Math.sqrt(0.9 / 1.1)), 1e-6);
        assertEquals(63.699, LINE.instrumentSigmaKms(), 1e-3);
        assertEquals(149.896229, FittingLine.elementKms(2000), 1e-6);
    }

    /**
     * A Gaussian without noise comes back, with the errors of the information matrix: here by
     * differences of the model, and inverted by Apache Commons Math.
     */
    @ParameterizedTest
    @CsvSource({"0.3, 20, 1", "0.5, -35, 1.2", "-0.4, 10, 0.9"})
    void aGaussianComesBackWithTheErrorsOfItsInformation(double depth, double at, double width) {
        double[] p = {1, 0.1, depth, at, width};
        LineFit fit = fit(spectrum(kms -> model(p, kms)), NoiseModel.INDEPENDENT);
        double[][] slopes = new double[PIXELS][5];
        int used = 0;
        for (int i = 0; i < PIXELS; i++) {
            if (kms(i) < -HALF || kms(i) >= HALF) {
                continue;
            }
            for (int k = 0; k < 5; k++) {
                double step = k == 3 ? 1e-3 : 1e-6;
                double[] more = p.clone();
                double[] less = p.clone();
                more[k] += step;
                less[k] -= step;
                slopes[used][k] = (model(more, kms(i)) - model(less, kms(i))) / (2 * step) / NOISE;
            }
            used++;
        }
        RealMatrix jacobian = new Array2DRowRealMatrix(Arrays.copyOf(slopes, used));
        RealMatrix covariance = MatrixUtils.inverse(jacobian.transpose().multiply(jacobian));
        assertEquals(at, fit.kms(), 0.01);
        assertEquals(width, fit.width(), 1e-3);
        double sigma = Math.sqrt(covariance.getEntry(3, 3));
        assertEquals(sigma, fit.sigmaKms(), 1e-3 * sigma);
        double signal = depth / Math.sqrt(covariance.getEntry(2, 2));
        assertEquals(signal, fit.signal(), 2e-3 * Math.abs(signal));
    }

    /** Noise shared by neighbours at lags 0.3 and 0.1 widens errors by the root of 1.8. */
    @Test
    void sharedNoiseWidensTheError() {
        Spectrum spectrum = spectrum(kms -> model(new double[] {1, 0, 0.3, 20, 1}, kms));
        LineFit alone = fit(spectrum, NoiseModel.INDEPENDENT);
        LineFit shared = fit(spectrum, new NoiseModel(false, 1, 0.3, 0.1));
        assertEquals(Math.sqrt(1.8), shared.sigmaKms() / alone.sigmaKms(), 1e-9);
        assertEquals(Math.sqrt(1.8), alone.signal() / shared.signal(), 1e-9);
        LineFit opposed = fit(spectrum, new NoiseModel(false, 1, -0.3, 0));
        assertEquals(alone.sigmaKms(), opposed.sigmaKms(), 1e-9, "errors are never narrowed");
    }

    /** A ripple of every other pixel is no line: it leaves chi square, and widens by its root. */
    @Test
    void aBadFitWidensTheError() {
        double[] p = {1, 0, 0.3, 20, 1};
        LineFit smooth = fit(spectrum(kms -> model(p, kms)), NoiseModel.INDEPENDENT);
        double ripple = 3 * NOISE;
        LineFit rough =
                fit(
                        spectrum(
                                kms ->
                                        model(p, kms)
                                                + (Math.round(kms / (ELEMENT / 10) - 0.3) % 2 == 0
                                                        ? ripple
                                                        : -ripple)),
                        NoiseModel.INDEPENDENT);
        // 50 pixels and five unknowns
        assertEquals(3 * Math.sqrt(50.0 / 45), rough.sigmaKms() / smooth.sigmaKms(), 0.1);
    }

    /** The pixels within the window, in velocity; flux and noise in units of the mean flux. */
    @Test
    void aSegmentHoldsThePixelsOfItsWindow() {
        LineSegment segment =
                LineSegment.of(spectrum(kms -> 4 + kms / 1000), LINE, 45).orElseThrow();
        assertEquals(50, segment.size());
        assertEquals(-325.5, segment.kms(0), 1e-6);
        assertEquals((-325.5 - 45) / HALF, segment.place(0), 1e-9);
        assertEquals(409.5, segment.kms(49), 1e-6);
        assertEquals(1, Arrays.stream(segment.fluxes()).average().orElseThrow(), 1e-12);
        double mean = 4 + 0.042;
        assertEquals((4 - 0.3255) / mean, segment.flux(0), 1e-9);
        assertEquals(Math.pow(mean / NOISE, 2), segment.weight(7), 1e-3);
    }

    private static Optional<LineSegment> without(double fromKms, double toKms) {
        return LineSegment.of(
                spectrum(kms -> kms > fromKms && kms < toKms ? Double.NaN : 1), LINE, 0);
    }

    /** A gap of more than one resolution element, 150 km/s, leaves no segment: also at the ends. */
    @Test
    void gapsAndTooFewPixelsLeaveNoSegment() {
        assertEquals(42, without(-50, 70).orElseThrow().size());
        assertTrue(without(-80, 80).isEmpty());
        assertTrue(without(-375, -245).isPresent());
        assertTrue(without(-375, -215).isEmpty());
        assertTrue(without(235, 375).isPresent());
        assertTrue(without(215, 375).isEmpty());
        assertTrue(LineSegment.of(spectrum(kms -> -1), LINE, 0).isEmpty(), "no flux");
        FittingLine narrow = new FittingLine("K I", REST, false, ELEMENT, 45);
        assertTrue(LineSegment.of(spectrum(kms -> 1), narrow, 0).isEmpty(), "six pixels");
        FittingLine wider = new FittingLine("K I", REST, false, ELEMENT, 50);
        assertEquals(7, LineSegment.of(spectrum(kms -> 1), wider, 0).orElseThrow().size());
    }

    /** Five is three times the error of 1.2 from noise and 0.9 from the scale, 1.5; not 4.4. */
    @Test
    void aVelocityIsSignificantBeyondThreeOfItsTotalErrors() {
        RadialVelocity fast = velocity(-5);
        assertEquals(1.5, fast.totalSigmaKms().orElseThrow(), 1e-12);
        assertEquals(OptionalDouble.of(-5), fast.significantKms());
        assertEquals(OptionalDouble.empty(), velocity(4.4).significantKms());
    }

    private static RadialVelocity velocity(double kms) {
        return new RadialVelocity(
                new emberline.measure.Measurement.Measured(kms, 1.2),
                0.9,
                java.util.List.of(),
                java.util.List.of());
    }
}
