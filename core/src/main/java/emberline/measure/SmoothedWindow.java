package emberline.measure;

import emberline.catalogue.Window;
import emberline.spectrum.Spectrum;
import org.apache.commons.statistics.distribution.NormalDistribution;

/**
 * The mean over a window of a spectrum that is smoothed from one resolving power to a coarser one,
 * as weights on the original pixels. Smoothing first and averaging then is the same as averaging
 * with a window whose edges are softened by the kernel, so the weight of a pixel is the share of
 * the kernel at that pixel that falls into the window.
 *
 * <p>The kernel at wavelength l is a Gaussian with the standard deviation l / (2 sqrt(2 ln 2))
 * sqrt(1/R_to^2 - 1/R_from^2).
 */
final class SmoothedWindow {

    /** Where the kernel is cut, in its standard deviations. */
    private static final double REACH = 4;

    private static final double FWHM_IN_SIGMA = 2 * Math.sqrt(2 * Math.log(2));
    private static final NormalDistribution NORMAL = NormalDistribution.of(0, 1);

    private final Spectrum spectrum;
    private final Window window;
    private final double sigmaPerMicron;

    /**
     * A softened window.
     *
     * @param spectrum the spectrum, for its grid
     * @param window the window (micron, vacuum)
     * @param from resolving power of the spectrum
     * @param to resolving power to reach, below {@code from}
     */
    SmoothedWindow(Spectrum spectrum, Window window, double from, double to) {
        if (!(to > 0) || !(from > to)) {
            throw new IllegalArgumentException(
                    "smoothing from R = " + from + " to R = " + to + ": expected 0 < to < from");
        }
        this.spectrum = spectrum;
        this.window = window;
        this.sigmaPerMicron = Math.sqrt(1 / (to * to) - 1 / (from * from)) / FWHM_IN_SIGMA;
    }

    /** The first pixel that may have weight. */
    int first() {
        return spectrum.firstAtOrAbove(window.lowMicron() * (1 - REACH * sigmaPerMicron));
    }

    /** One past the last pixel that may have weight. */
    int end() {
        return spectrum.firstAtOrAbove(window.highMicron() * (1 + REACH * sigmaPerMicron));
    }

    /** Share of the kernel at a pixel that falls into the window, 0 to 1. */
    double share(int pixel) {
        double micron = spectrum.wavelengthMicron(pixel);
        return NORMAL.probability(
                deviates(window.lowMicron(), micron), deviates(window.highMicron(), micron));
    }

    /** How many standard deviations of the kernel centred at an edge a pixel lies below it. */
    private double deviates(double edgeMicron, double pixelMicron) {
        return (edgeMicron - pixelMicron) / (edgeMicron * sigmaPerMicron);
    }
}
