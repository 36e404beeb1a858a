package emberline.prepare;

import emberline.spectrum.Spectrum;
import java.util.Arrays;
import org.apache.commons.math3.special.Erf;

/**
 * A spectrum as a spectrograph of lower resolving power would sample it: each pixel is the mean of
 * the finer pixels under a Gaussian, two pixels to a resolution element, and never more than there
 * were. The Gaussian supplies what the spectrum lacks: its width is that of the lower resolution
 * less, in squares, that of the spectrum's own.
 */
final class CoarserGrid {

    private static final double PIXELS_PER_ELEMENT = 2;
    private static final double FWHM_PER_SIGMA = 2 * Math.sqrt(2 * Math.log(2));

    /** Sigmas of the Gaussian beyond which nothing is summed. */
    private static final double REACH = 4;

    /** Share of the Gaussian that good pixels must cover. */
    private static final double LEAST_COVERED = 0.5;

    private final Spectrum fine;
    private final double[] centres;

    /** Sigma of the Gaussian in units of the wavelength. */
    private final double relativeSigma;

    private CoarserGrid(Spectrum fine, double[] centres, double relativeSigma) {
        this.fine = fine;
        this.centres = centres;
        this.relativeSigma = relativeSigma;
    }

    /**
     * A grid for a spectrum.
     *
     * @param fine the grid of the spectrum
     * @param own its resolving power
     * @param power the resolving power wanted, below its own
     */
    static CoarserGrid of(Spectrum fine, double own, double power) {
        double[] centres = new double[fine.size()];
        int count = 0;
        double last = fine.wavelengthMicron(fine.size() - 1);
        double at = fine.wavelengthMicron(0);
        while (at <= last && count < centres.length) {
            centres[count++] = at;
            int near = Math.min(fine.firstAtOrAbove(at), fine.size() - 1);
            at += Math.max(at / power / PIXELS_PER_ELEMENT, fine.localSpacingMicron(near));
        }
        double missing = Math.sqrt(1 / (power * power) - 1 / (own * own));
        return new CoarserGrid(fine, Arrays.copyOf(centres, count), missing / FWHM_PER_SIGMA);
    }

    int size() {
        return centres.length;
    }

    double[] wavelengthsMicron() {
        return centres.clone();
    }

    /** Means under the Gaussians; NaN where bad pixels or gaps leave too little. */
    double[] means(double[] flux) {
        double[] means = new double[centres.length];
        for (int k = 0; k < means.length; k++) {
            means[k] = summed(k, flux, flux, false);
        }
        return means;
    }

    /** One-sigma noise of the means from independent noise of the finer pixels. */
    double[] sigmas(double[] flux, double[] sigma) {
        double[] sigmas = new double[centres.length];
        for (int k = 0; k < sigmas.length; k++) {
            sigmas[k] = Math.sqrt(summed(k, flux, sigma, true));
        }
        return sigmas;
    }

    /** The weighted mean of values, or of the squares of noise with squared weights. */
    private double summed(int k, double[] flux, double[] values, boolean squared) {
        double width = relativeSigma * centres[k];
        int near = Math.min(fine.firstAtOrAbove(centres[k]), fine.size() - 1);
        double reach = Math.max(REACH * width, fine.localSpacingMicron(near));
        double weights = 0;
        double sum = 0;
        for (int i = Math.max(0, fine.firstAtOrAbove(centres[k] - reach) - 1);
                i < fine.size() && fine.wavelengthMicron(i) <= centres[k] + 2 * reach;
                i++) {
            double weight =
                    below((fine.highEdgeMicron(i) - centres[k]) / width)
                            - below((fine.lowEdgeMicron(i) - centres[k]) / width);
            if (weight > 0 && Double.isFinite(flux[i]) && Double.isFinite(values[i])) {
                weights += weight;
                sum += squared ? weight * weight * values[i] * values[i] : weight * values[i];
            }
        }
        if (weights < LEAST_COVERED) {
            return Double.NaN;
        }
        return squared ? sum / (weights * weights) : sum / weights;
    }

    /** The share of a normal distribution below so many sigmas. */
    private static double below(double sigmas) {
        return 0.5 * (1 + Erf.erf(sigmas / Math.sqrt(2)));
    }
}
