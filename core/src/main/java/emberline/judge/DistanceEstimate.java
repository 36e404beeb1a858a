package emberline.judge;

/**
 * A distance and how it was found.
 *
 * @param pc the distance (parsec)
 * @param method {@code parallax}, {@code photometry (BAND)} or {@code photometry (BAND) and
 *     parallax}
 */
public record DistanceEstimate(Estimate pc, String method) {

    /**
     * Relative one-sigma error.
     *
     * @return error by value
     */
    public double relativeSigma() {
        return pc.sigma() / pc.median();
    }
}
