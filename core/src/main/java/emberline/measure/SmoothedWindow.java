package emberline.measure;

import emberline.catalogue.Window;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegrator;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;
import org.apache.commons.statistics.distribution.NormalDistribution;

/**
 * Means and moments over a window of a spectrum that is smoothed from one resolving power to a
 * coarser one, as weights on the original pixels. Smoothing first and averaging then is the same as
 * averaging with a window whose edges are softened by the kernel.
 *
 * <p>The kernel at wavelength l is a Gaussian with the standard deviation l / (2 sqrt(2 ln 2))
 * sqrt(1/R_to^2 - 1/R_from^2). Both kinds of weight are integrated over the whole pixel, so that
 * cutting a pixel in two changes nothing.
 */
final class SmoothedWindow {

    /** Where the kernel is cut, in its standard deviations. */
    private static final double REACH = 4;

    private static final double FWHM_IN_SIGMA = 2 * Math.sqrt(2 * Math.log(2));
    private static final NormalDistribution NORMAL = NormalDistribution.of(0, 1);

    /** Points of a panel of the quadrature over the window, and the panel's widest in sigmas. */
    private static final int POINTS = 5;

    private static final double PANEL = 2;

    private final PixelEdges edges;
    private final Window window;
    private final double sigmaPerMicron;
    private final double lowest;
    private final double highest;
    private final int first;
    private final int end;

    /**
     * A softened window.
     *
     * @param edges the pixels
     * @param window the window (micron, vacuum)
     * @param from resolving power of the spectrum
     * @param to resolving power to reach, below {@code from}
     */
    SmoothedWindow(PixelEdges edges, Window window, double from, double to) {
        if (!(to > 0) || !(from > to)) {
            throw new IllegalArgumentException(
                    "smoothing from R = " + from + " to R = " + to + ": expected 0 < to < from");
        }
        this.edges = edges;
        this.window = window;
        this.sigmaPerMicron = Math.sqrt(1 / (to * to) - 1 / (from * from)) / FWHM_IN_SIGMA;
        this.lowest = window.lowMicron() * (1 - REACH * sigmaPerMicron);
        this.highest = window.highMicron() * (1 + REACH * sigmaPerMicron);
        this.first = edges.firstEndingAbove(lowest);
        this.end = edges.firstStartingAtOrAbove(highest);
    }

    /** The first pixel that may have weight. */
    int first() {
        return first;
    }

    /** For each pixel from the first on the integral of the softened window over it (micron). */
    double[] integrals() {
        double[] weights = new double[Math.max(0, end - first)];
        for (int k = 0; k < weights.length; k++) {
            int pixel = first + k;
            double width = edges.overlap(pixel, lowest, highest);
            if (width > 0) {
                double a = Math.max(edges.low(pixel), lowest);
                double b = Math.min(edges.high(pixel), highest);
                weights[k] = below(window.highMicron(), a, b) - below(window.lowMicron(), a, b);
            }
        }
        return weights;
    }

    /** Integral from a to b of the share of the kernel there that lies below an edge (micron). */
    private double below(double edge, double a, double b) {
        double sigma = edge * sigmaPerMicron;
        return sigma
                * (cumulativeIntegral((edge - a) / sigma) - cumulativeIntegral((edge - b) / sigma));
    }

    /** The integral of the normal distribution function up to z. */
    private static double cumulativeIntegral(double z) {
        return z * NORMAL.cumulativeProbability(z) + NORMAL.density(z);
    }

    /**
     * For each pixel from the first on what it adds to a moment of the smoothed flux over the true
     * window: the integral over the window of the share of the pixel in the kernel there, times a
     * power of x (micron). By Gauss-Legendre quadrature over the window.
     *
     * @param power of x, which runs from -1 to 1 over the window
     */
    double[] moments(int power) {
        double[] weights = new double[Math.max(0, end - first)];
        double half = window.widthMicron() / 2;
        int panels =
                (int)
                        Math.ceil(
                                window.widthMicron()
                                        / (PANEL * window.lowMicron() * sigmaPerMicron));
        GaussIntegrator rule = new GaussIntegratorFactory().legendre(POINTS);
        for (int panel = 0; panel < panels; panel++) {
            for (int point = 0; point < POINTS; point++) {
                double x = (2 * panel + 1 + rule.getPoint(point)) / panels - 1;
                double micron = window.centreMicron() + x * half;
                double weight = half / panels * rule.getWeight(point) * Math.pow(x, power);
                addKernel(micron, weight, weights);
            }
        }
        return weights;
    }

    /** Adds the shares of the pixels in the kernel at a wavelength, times a weight. */
    private void addKernel(double micron, double weight, double[] weights) {
        double sigma = micron * sigmaPerMicron;
        double low = micron - REACH * sigma;
        double high = micron + REACH * sigma;
        int from = Math.max(first, edges.firstEndingAbove(low));
        int to = Math.min(end, edges.firstStartingAtOrAbove(high));
        for (int pixel = from; pixel < to; pixel++) {
            if (edges.overlap(pixel, low, high) > 0) {
                weights[pixel - first] +=
                        weight
                                * NORMAL.probability(
                                        (Math.max(edges.low(pixel), low) - micron) / sigma,
                                        (Math.min(edges.high(pixel), high) - micron) / sigma);
            }
        }
    }
}
