package emberline.prepare;

import java.util.Arrays;

/**
 * The noise of a spectrum from the scatter of its pixels: the second difference f(i-1) - 2 f(i) +
 * f(i+1) of a smooth spectrum with independent noise of one sigma s has the standard deviation s
 * times the root of 6; its median absolute value over neighbouring pixels, times 1.4826 and divided
 * by that root, estimates s. Neighbouring pixels that share noise, as in resampled spectra, make
 * the estimate too small; spectral lines as narrow as a pixel make it too large.
 */
final class PixelScatter {

    private static final double MAD_TO_SIGMA = 1.4826;
    private static final double ROOT_6 = Math.sqrt(6);

    /** Pixels to each side over which the local scatter is taken. */
    private static final int HALF_WINDOW = 25;

    private PixelScatter() {}

    /**
     * The local noise of each pixel.
     *
     * @param flux fluxes; NaN marks bad pixels
     * @return one-sigma noise, as many as fluxes; NaN where fewer than three second differences are
     *     at hand
     */
    static double[] sigma(double[] flux) {
        double[] second = secondDifferences(flux);
        double[] sigma = new double[flux.length];
        double[] near = new double[2 * HALF_WINDOW + 1];
        for (int i = 0; i < flux.length; i++) {
            int count = 0;
            int to = Math.min(flux.length - 1, i + HALF_WINDOW);
            for (int k = Math.max(0, i - HALF_WINDOW); k <= to; k++) {
                if (Double.isFinite(second[k])) {
                    near[count++] = Math.abs(second[k]);
                }
            }
            sigma[i] =
                    count < 3
                            ? Double.NaN
                            : MAD_TO_SIGMA * median(Arrays.copyOf(near, count)) / ROOT_6;
        }
        return sigma;
    }

    /**
     * The scatter of the pixels in units of the stated noise.
     *
     * @param flux fluxes; NaN marks bad pixels
     * @param sigma stated one-sigma noise
     * @return the ratio, 1 where the stated noise is right; NaN where it cannot be told
     */
    static double inUnitsOf(double[] flux, double[] sigma) {
        double[] second = secondDifferences(flux);
        double[] ratios = new double[flux.length];
        int count = 0;
        for (int i = 0; i < flux.length; i++) {
            if (Double.isFinite(second[i]) && sigma[i] > 0 && Double.isFinite(sigma[i])) {
                ratios[count++] = Math.abs(second[i]) / sigma[i];
            }
        }
        return count < 10
                ? Double.NaN
                : MAD_TO_SIGMA * median(Arrays.copyOf(ratios, count)) / ROOT_6;
    }

    private static double[] secondDifferences(double[] flux) {
        double[] second = new double[flux.length];
        Arrays.fill(second, Double.NaN);
        for (int i = 1; i < flux.length - 1; i++) {
            second[i] = flux[i - 1] - 2 * flux[i] + flux[i + 1];
        }
        return second;
    }

    private static double median(double[] values) {
        Arrays.sort(values);
        int middle = values.length / 2;
        return values.length % 2 == 1 ? values[middle] : (values[middle - 1] + values[middle]) / 2;
    }
}
