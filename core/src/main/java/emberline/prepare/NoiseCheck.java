package emberline.prepare;

import emberline.read.Observation;
import emberline.spectrum.Finding;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Settles the noise of a spectrum: taken from the file, scaled up where it is far below the scatter
 * of the pixels, or estimated from that scatter where the file has none.
 */
final class NoiseCheck {

    /** Stated noise is scaled where the scatter exceeds it by more than this factor. */
    private static final double TOO_SMALL = 3;

    /** Stated noise is remarked on where the scatter is below it by more than this factor. */
    private static final double TOO_LARGE = 3;

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

    static Settled settle(Observation observation, double[] flux) {
        Optional<double[]> stated = observation.fluxSigmas().filter(NoiseCheck::isUsable);
        if (stated.isEmpty()) {
            return estimated(flux, observation.fluxSigmas().isPresent());
        }
        double[] sigma = stated.get();
        int zero = 0;
        for (int i = 0; i < sigma.length; i++) {
            if (!(sigma[i] > 0)) {
                zero += Double.isFinite(flux[i]) ? 1 : 0;
                sigma[i] = Double.NaN;
            }
        }
        List<Finding> findings = new ArrayList<>();
        if (zero > 0) {
            findings.add(
                    Finding.note(
                            "pixels-without-sigma",
                            zero + " pixels have no positive sigma and count as bad"));
        }
        double ratio = PixelScatter.inUnitsOf(flux, sigma);
        if (ratio > TOO_SMALL) {
            for (int i = 0; i < sigma.length; i++) {
                sigma[i] *= ratio;
            }
            findings.add(
                    Finding.caution(
                            "sigma-too-small",
                            String.format(
                                    Locale.ROOT,
                                    "the pixels scatter %.1f times more than their stated sigma;"
                                            + " the sigma was multiplied by that",
                                    ratio)));
            return new Settled(sigma, new NoiseModel(false, ratio, 0, 0), findings);
        }
        if (ratio < 1 / TOO_LARGE) {
            findings.add(
                    Finding.note(
                            "sigma-above-scatter",
                            String.format(
                                    Locale.ROOT,
                                    "the pixels scatter %.2f times their stated sigma: correlated"
                                            + " noise or a cautious sigma; left as it is",
                                    ratio)));
        }
        return new Settled(sigma, NoiseModel.INDEPENDENT, findings);
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

    private static Settled estimated(double[] flux, boolean stated) {
        String why = stated ? "the sigma column is mostly empty" : "the file states no sigma";
        return new Settled(
                PixelScatter.sigma(flux),
                new NoiseModel(true, 1, 0, 0),
                List.of(
                        Finding.caution(
                                "sigma-estimated",
                                why
                                        + "; it was estimated from the pixel-to-pixel scatter,"
                                        + " which is too small where pixels share noise")));
    }
}
