package emberline.measure;

import emberline.spectrum.Spectrum;

/**
 * Gaussian smoothing of a spectrum from one resolving power to a coarser one, as weights on the
 * original pixels, so that what is measured on the smoothed spectrum stays a linear functional of
 * the original pixels and its noise stays exact.
 *
 * <p>The kernel at wavelength l has the standard deviation l / (2 sqrt(2 ln 2)) sqrt(1/R_to^2 -
 * 1/R_from^2). It is normalised over the good pixels within {@value #REACH} standard deviations.
 */
final class SmoothingKernel {

    /** Where the kernel is cut, in its standard deviations. */
    static final double REACH = 3.5;

    private static final double FWHM_IN_SIGMA = 2 * Math.sqrt(2 * Math.log(2));

    private final Spectrum spectrum;
    private final double sigmaPerMicron;

    /**
     * A kernel for one spectrum.
     *
     * @param spectrum the spectrum, for its grid and its good pixels
     * @param from its resolving power
     * @param to the resolving power to reach, below {@code from}
     */
    SmoothingKernel(Spectrum spectrum, double from, double to) {
        if (!(to > 0) || !(from > to)) {
            throw new IllegalArgumentException(
                    "smoothing from R = " + from + " to R = " + to + ": expected 0 < to < from");
        }
        this.spectrum = spectrum;
        this.sigmaPerMicron = Math.sqrt(1 / (to * to) - 1 / (from * from)) / FWHM_IN_SIGMA;
    }

    /** The first original pixel that has weight in a smoothed pixel. */
    int first(int pixel) {
        double micron = spectrum.wavelengthMicron(pixel);
        return Math.min(pixel, spectrum.firstAtOrAbove(micron * (1 - REACH * sigmaPerMicron)));
    }

    /** One past the last original pixel that has weight in a smoothed pixel. */
    int end(int pixel) {
        double micron = spectrum.wavelengthMicron(pixel);
        return Math.max(pixel + 1, spectrum.firstAtOrAbove(micron * (1 + REACH * sigmaPerMicron)));
    }

    /**
     * Adds the weights of a smoothed pixel, times a factor, to weights on original pixels.
     *
     * @param pixel the smoothed pixel
     * @param factor its own weight
     * @param widths widths of the original pixels (micron), 0 for bad ones
     * @param target weights on original pixels; index 0 is pixel {@code offset}
     * @param offset the pixel of index 0
     */
    void spread(int pixel, double factor, double[] widths, double[] target, int offset) {
        double centre = spectrum.wavelengthMicron(pixel);
        double sigma = centre * sigmaPerMicron;
        int first = first(pixel);
        int end = end(pixel);
        double[] kernel = new double[end - first];
        double sum = 0;
        for (int i = first; i < end; i++) {
            if (widths[i] > 0) {
                double x = (spectrum.wavelengthMicron(i) - centre) / sigma;
                kernel[i - first] = widths[i] * Math.exp(-0.5 * x * x);
                sum += kernel[i - first];
            }
        }
        for (int i = first; i < end; i++) {
            target[i - offset] += factor * kernel[i - first] / sum;
        }
    }
}
