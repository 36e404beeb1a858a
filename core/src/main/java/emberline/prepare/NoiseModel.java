package emberline.prepare;

/**
 * How the noise of a spectrum is known and how neighbouring pixels share it.
 *
 * @param estimated true where the file has no sigma and it was estimated from the pixel scatter
 * @param scale the factor by which the sigma of the file was multiplied; 1 where it was left alone
 * @param lag1 correlation of the noise of neighbouring pixels, -1 to 1
 * @param lag2 correlation of the noise of next-but-one pixels, -1 to 1
 */
public record NoiseModel(boolean estimated, double scale, double lag1, double lag2) {

    /** Noise that is independent from pixel to pixel and given by the file. */
    public static final NoiseModel INDEPENDENT = new NoiseModel(false, 1, 0, 0);

    /** Checks the ranges. */
    public NoiseModel {
        if (!(scale > 0)
                || Double.isInfinite(scale)
                || !(Math.abs(lag1) <= 1)
                || !(Math.abs(lag2) <= 1)) {
            throw new IllegalArgumentException(
                    "noise model with scale "
                            + scale
                            + ", lags "
                            + lag1
                            + " and "
                            + lag2
                            + ": expected a positive scale and correlations from -1 to 1");
        }
    }
}
