package emberline.spectrum;

/**
 * A magnitude.
 *
 * @param mag the magnitude (Vega)
 * @param sigmaMag one-sigma error (mag), not negative
 */
public record Magnitude(double mag, double sigmaMag) {

    /** Checks the numbers. */
    public Magnitude {
        if (!Double.isFinite(mag) || !(sigmaMag >= 0) || Double.isInfinite(sigmaMag)) {
            throw new IllegalArgumentException(
                    "magnitude " + mag + " +- " + sigmaMag + ": expected finite numbers");
        }
    }
}
