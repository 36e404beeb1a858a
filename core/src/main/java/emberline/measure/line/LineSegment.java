package emberline.measure.line;

import emberline.spectrum.Spectrum;
import java.util.Optional;

/**
 * The good pixels around a line: velocity of each against the line at rest (km/s), flux and noise
 * in units of the mean flux.
 */
final class LineSegment {

    /** A fit has five unknowns; fewer pixels than this leave its quality open. */
    private static final int LEAST_PIXELS = 7;

    private final double centreKms;
    private final double halfKms;
    private final double[] kms;
    private final double[] flux;
    private final double[] sigma;

    private LineSegment(
            double centreKms, double halfKms, double[] kms, double[] flux, double[] sigma) {
        this.centreKms = centreKms;
        this.halfKms = halfKms;
        this.kms = kms;
        this.flux = flux;
        this.sigma = sigma;
    }

    /**
     * The pixels around a line.
     *
     * @param spectrum the spectrum
     * @param line the line with its window
     * @param centreKms velocity at the middle of the window
     * @return the pixels; empty where they are too few, leave a gap of more than a resolution
     *     element, or have a mean flux that is not positive
     */
    static Optional<LineSegment> of(Spectrum spectrum, FittingLine line, double centreKms) {
        double low = centreKms - line.halfWindowKms();
        double high = centreKms + line.halfWindowKms();
        int from = spectrum.firstAtOrAbove(line.receivedMicron(low));
        int to = spectrum.firstAtOrAbove(line.receivedMicron(high));
        double[] kms = new double[to - from];
        double[] flux = new double[to - from];
        double[] sigma = new double[to - from];
        int count = 0;
        double before = low;
        double gap = 0;
        double sum = 0;
        for (int i = from; i < to; i++) {
            if (spectrum.isGood(i) && spectrum.fluxSigma(i) > 0) {
                kms[count] = line.velocityKms(spectrum.wavelengthMicron(i));
                flux[count] = spectrum.flux(i);
                sigma[count] = spectrum.fluxSigma(i);
                sum += flux[count];
                gap = Math.max(gap, kms[count] - before);
                before = kms[count];
                count++;
            }
        }
        gap = Math.max(gap, high - before);
        if (count < LEAST_PIXELS || gap > line.elementKms() || !(sum > 0)) {
            return Optional.empty();
        }
        return Optional.of(
                new LineSegment(
                        centreKms,
                        line.halfWindowKms(),
                        scaled(kms, count, 1),
                        scaled(flux, count, count / sum),
                        scaled(sigma, count, count / sum)));
    }

    private static double[] scaled(double[] values, int count, double factor) {
        double[] scaled = new double[count];
        for (int i = 0; i < count; i++) {
            scaled[i] = values[i] * factor;
        }
        return scaled;
    }

    int size() {
        return kms.length;
    }

    double kms(int pixel) {
        return kms[pixel];
    }

    /** Place in the window, -1 to 1. */
    double place(int pixel) {
        return (kms[pixel] - centreKms) / halfKms;
    }

    double flux(int pixel) {
        return flux[pixel];
    }

    /** One over the square of the noise. */
    double weight(int pixel) {
        return 1 / (sigma[pixel] * sigma[pixel]);
    }

    double[] fluxes() {
        return flux.clone();
    }
}
