package emberline.prepare;

import emberline.spectrum.Finding;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Settles the noise of a spectrum: taken from the file, scaled up where it is far below the scatter
 * of the pixels, or estimated from that scatter where the file has none.
 */
final class NoiseCheck {

    /** Stated noise is scaled where even the quiet scatter exceeds it by more than this factor. */
    private static final double TOO_SMALL = 3;

    /** Stated noise is remarked on where the scatter is below it by more than this factor. */
    private static final double TOO_LARGE = 3;

    /** Stated noise that exceeds the scatter by more than this is not the noise of these pixels. */
    private static final double OTHER_SCALE = 50;

    /** Factor within which scatter and correlation must agree on the noise. */
    private static final double SAME_STORY = 1.5;

    /** Factor by which lines may add to the scatter of all pixels over the quietest. */
    private static final double LINE_FREE = 1.25;

    private NoiseCheck() {}

    /**
     * Noise as settled.
     *
     * @param sigma one-sigma noise of each pixel; NaN where the pixel is bad
     * @param model how it is known
     * @param findings what was found
     */
    @SuppressWarnings("ArrayRecordComponent") // handed on within the package, never compared
    record Settled(double[] sigma, NoiseModel model, List<Finding> findings) {}

    /**
     * Settles the noise.
     *
     * @param inFile the sigma of the file, as many as fluxes; empty where it has none
     * @param flux fluxes; NaN marks bad pixels
     * @return the noise, with a finding for everything that was assumed or changed
     */
    static Settled settle(Optional<double[]> inFile, double[] flux) {
        Optional<double[]> stated = inFile.filter(NoiseCheck::isUsable);
        if (stated.isEmpty()) {
            return estimated(
                    flux,
                    inFile.isPresent()
                            ? "the sigma column is mostly empty"
                            : "the file states no sigma");
        }
        double[] sigma = stated.get().clone();
        int zero = 0;
        for (int i = 0; i < sigma.length; i++) {
            if (!(sigma[i] > 0)) {
                zero += Double.isFinite(flux[i]) ? 1 : 0;
                sigma[i] = Double.NaN;
            }
        }
        if (isOnOtherScale(flux, sigma)) {
            return estimated(
                    flux,
                    String.format(
                            Locale.ROOT,
                            "the stated sigma exceeds the flux of most pixels, and the scatter of"
                                    + " neighbours by a factor of %.0f: it cannot be on the scale"
                                    + " of the flux and was set aside",
                            1 / PixelScatter.inUnitsOf(flux, sigma)));
        }
        List<Finding> findings = new ArrayList<>();
        if (zero > 0) {
            findings.add(
                    Finding.note(
                            "pixels-without-sigma",
                            zero + " pixels have no positive sigma and count as bad"));
        }
        double quiet = PixelScatter.quietInUnitsOf(flux, sigma);
        return quiet > TOO_SMALL
                ? scaled(flux, sigma, quiet, findings)
                : withCorrelation(flux, sigma, PixelScatter.inUnitsOf(flux, sigma), findings);
    }

    /**
     * Noise whose sigma is too small. The scatter is all that is known of it then, so what shared
     * noise takes from the scatter is put back, as where the sigma is estimated. Sharing is
     * believed where it makes the scatter of all pixels and that of the quietest tell the same
     * noise; lines look like sharing too, but are missing from the quietest part.
     */
    private static Settled scaled(
            double[] flux, double[] sigma, double quiet, List<Finding> findings) {
        NoiseCorrelation seen = NoiseCorrelation.of(flux, sigma);
        double everywhere = PixelScatter.inUnitsOf(flux, sigma) * seen.scatterDeficit();
        boolean shared = everywhere < LINE_FREE * quiet * seen.thirdDeficit();
        NoiseCorrelation correlation = shared ? seen : NoiseCorrelation.NONE;
        double scale = quiet * correlation.thirdDeficit();
        for (int i = 0; i < sigma.length; i++) {
            sigma[i] *= scale;
        }
        findings.add(
                Finding.caution(
                        "sigma-too-small",
                        String.format(
                                Locale.ROOT,
                                "even where the spectrum is smoothest the pixels scatter %.1f times"
                                        + " more than their stated sigma; the sigma was multiplied"
                                        + " by %.1f",
                                quiet,
                                scale)));
        if (correlation.lag1() > 0) {
            findings.add(correlated(correlation));
        }
        return new Settled(
                sigma,
                new NoiseModel(false, scale, correlation.lag1(), correlation.lag2()),
                findings);
    }

    /**
     * Noise whose sigma is taken as stated. Shared noise makes the pixels scatter less than their
     * sigma; it is believed where the scatter and the correlation of neighbours tell the same.
     */
    private static Settled withCorrelation(
            double[] flux, double[] sigma, double ratio, List<Finding> findings) {
        NoiseCorrelation correlation = NoiseCorrelation.of(flux, sigma);
        double agreement = ratio * correlation.scatterDeficit();
        boolean shared =
                correlation.lag1() > 0 && agreement < SAME_STORY && agreement > 1 / SAME_STORY;
        if (shared) {
            findings.add(correlated(correlation));
            return new Settled(
                    sigma,
                    new NoiseModel(false, 1, correlation.lag1(), correlation.lag2()),
                    findings);
        }
        if (ratio < 1 / TOO_LARGE) {
            findings.add(
                    Finding.note(
                            "sigma-above-scatter",
                            String.format(
                                    Locale.ROOT,
                                    "the pixels scatter %.2f times their stated sigma: a cautious"
                                            + " sigma; left as it is",
                                    ratio)));
        }
        return new Settled(sigma, NoiseModel.INDEPENDENT, findings);
    }

    private static Finding correlated(NoiseCorrelation correlation) {
        return Finding.note(
                "noise-shared",
                String.format(
                        Locale.ROOT,
                        "neighbouring pixels share their noise (correlation %.2f, next but one"
                                + " %.2f), as in resampled spectra; this is carried into all"
                                + " errors",
                        correlation.lag1(),
                        correlation.lag2()));
    }

    /** Whether most pixels have a positive sigma. */
    private static boolean isUsable(double[] sigma) {
        int positive = 0;
        for (double value : sigma) {
            if (value > 0 && Double.isFinite(value)) {
                positive++;
            }
        }
        return 2 * positive > sigma.length;
    }

    /**
     * Whether the stated sigma contradicts the fluxes: it exceeds most of them, so that neighbours
     * should differ by more than they are, and yet they agree far better than any sharing of noise
     * or caution in a sigma could explain. Flux and sigma were then written in different units.
     */
    private static boolean isOnOtherScale(double[] flux, double[] sigma) {
        int below = 0;
        int good = 0;
        for (int i = 0; i < flux.length; i++) {
            if (Double.isFinite(flux[i]) && Double.isFinite(sigma[i])) {
                good++;
                below += Math.abs(flux[i]) < sigma[i] ? 1 : 0;
            }
        }
        if (2 * below <= good) {
            return false;
        }
        double scatter = PixelScatter.inUnitsOf(flux, sigma);
        return scatter > 0 && scatter < 1 / OTHER_SCALE;
    }

    private static Settled estimated(double[] flux, String why) {
        double[] sigma = PixelScatter.sigma(flux);
        if (!Arrays.stream(sigma).anyMatch(s -> s > 0)) {
            return new Settled(
                    sigma,
                    new NoiseModel(true, 1, 0, 0),
                    List.of(
                            Finding.warning(
                                    "noise-unknown",
                                    why
                                            + " and most neighbouring pixels do not differ, so that"
                                            + " it cannot be estimated: nothing is measured; use a"
                                            + " file with a sigma column")));
        }
        NoiseCorrelation correlation = NoiseCorrelation.of(flux, sigma);
        for (int i = 0; i < sigma.length; i++) {
            sigma[i] *= correlation.scatterDeficit();
        }
        List<Finding> findings = new ArrayList<>();
        findings.add(
                Finding.caution(
                        "sigma-estimated",
                        why
                                + "; it was estimated from the pixel-to-pixel scatter and may be"
                                + " wrong by a factor of two"));
        if (correlation.lag1() > 0) {
            findings.add(correlated(correlation));
        }
        return new Settled(
                sigma, new NoiseModel(true, 1, correlation.lag1(), correlation.lag2()), findings);
    }
}
