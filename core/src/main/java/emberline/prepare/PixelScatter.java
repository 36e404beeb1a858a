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

    /** Least share of the scatter of the whole spectrum that the local noise can have. */
    private static final double LEAST_SHARE = 0.5;

    /** Pixels of the windows among which the quietest are sought; each overlaps half the next. */
    private static final int QUIET_WINDOW = 25;

    /** Share of the windows that are quieter than the one taken. */
    private static final double QUIET_SHARE = 0.1;

    private static final int FEWEST_WINDOWS = 4;
    private static final int FEWEST_IN_WINDOW = 15;

    /**
     * What the quiet scatter of pure noise is in units of its sigma before this correction: 0.475,
     * 0.459 and 0.451 in spectra of 300, 1000 and 5000 pixels (150 simulations each).
     */
    private static final double QUIET_OF_NOISE = 0.46;

    private static final double ROOT_20 = Math.sqrt(20);

    private PixelScatter() {}

    /**
     * The local noise of each pixel, at least half that of the whole spectrum: quantised or locally
     * constant fluxes have no scatter of their own and yet no perfect pixels.
     *
     * @param flux fluxes; NaN marks bad pixels
     * @return one-sigma noise, positive, as many as fluxes; NaN where fewer than three second
     *     differences are at hand, and everywhere if most second differences are zero
     */
    static double[] sigma(double[] flux) {
        double[] second = secondDifferences(flux);
        double least = LEAST_SHARE * whole(second);
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
                    count < 3 || !(least > 0)
                            ? Double.NaN
                            : Math.max(
                                    least,
                                    MAD_TO_SIGMA * median(Arrays.copyOf(near, count)) / ROOT_6);
        }
        return sigma;
    }

    /** One noise for the whole spectrum; NaN where fewer than three differences are at hand. */
    private static double whole(double[] second) {
        double[] sizes = Arrays.stream(second).filter(Double::isFinite).map(Math::abs).toArray();
        return sizes.length < 3 ? Double.NaN : MAD_TO_SIGMA * median(sizes) / ROOT_6;
    }

    /**
     * The scatter of the pixels in units of the stated noise where the spectrum is quietest, so
     * that lines and bands are not taken for noise: the third differences f(i-1) - 3 f(i) + 3
     * f(i+1) - f(i+2), which a smooth spectrum leaves smaller than second ones, over sigma times
     * the root of 20; their median absolute value in windows of {@value #QUIET_WINDOW} pixels; of
     * these the value that a tenth of the windows fall short of, in units of what pure noise gives.
     *
     * @param flux fluxes; NaN marks bad pixels
     * @param sigma stated one-sigma noise
     * @return the ratio, about 1 where the stated noise is right and independent from pixel to
     *     pixel; NaN where there are too few pixels to tell
     */
    static double quietInUnitsOf(double[] flux, double[] sigma) {
        double[] ratios = new double[flux.length];
        Arrays.fill(ratios, Double.NaN);
        for (int i = 1; i < flux.length - 2; i++) {
            double third = flux[i - 1] - 3 * flux[i] + 3 * flux[i + 1] - flux[i + 2];
            if (sigma[i] > 0) {
                ratios[i] = Math.abs(third) / (sigma[i] * ROOT_20);
            }
        }
        double[] medians = new double[flux.length];
        int windows = 0;
        for (int from = 0; from + QUIET_WINDOW <= ratios.length; from += QUIET_WINDOW / 2) {
            double[] window =
                    Arrays.stream(ratios, from, from + QUIET_WINDOW)
                            .filter(Double::isFinite)
                            .toArray();
            if (window.length >= FEWEST_IN_WINDOW) {
                medians[windows++] = median(window);
            }
        }
        if (windows < FEWEST_WINDOWS) {
            return Double.NaN;
        }
        double[] sorted = Arrays.copyOf(medians, windows);
        Arrays.sort(sorted);
        double place = QUIET_SHARE * (windows - 1);
        int below = (int) place;
        double above = sorted[Math.min(below + 1, windows - 1)];
        return (sorted[below] + (place - below) * (above - sorted[below])) / QUIET_OF_NOISE;
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
