package emberline.prepare;

/**
 * How the noise of a spectrum is known and how neighbouring pixels share it.
 *
 * @param estimated true where the file has no sigma and it was estimated from the pixel scatter
 * @param scale the factor by which the sigma of the file was multiplied; 1 where it was left alone
 * @param lag1 correlation of the noise of neighbouring pixels
 * @param lag2 correlation of the noise of next-but-one pixels; with {@code lag1} it must give no
 *     negative power 1 + 2 lag1 cos t + 2 lag2 cos 2t at any frequency t
 */
public record NoiseModel(boolean estimated, double scale, double lag1, double lag2) {

    /** Noise that is independent from pixel to pixel and given by the file. */
    public static final NoiseModel INDEPENDENT = new NoiseModel(false, 1, 0, 0);

    /**
     * Checks the ranges.
     *
     * @throws IllegalArgumentException if the scale is not positive and finite or no noise can have
     *     these correlations
     */
    public NoiseModel {
        if (!(scale > 0) || Double.isInfinite(scale) || !NoiseCorrelation.isPossible(lag1, lag2)) {
            throw new IllegalArgumentException(
                    "noise model with scale "
                            + scale
                            + ", lags "
                            + lag1
                            + " and "
                            + lag2
                            + ": expected a positive, finite scale and correlations that give no"
                            + " negative power at any frequency");
        }
    }
}
