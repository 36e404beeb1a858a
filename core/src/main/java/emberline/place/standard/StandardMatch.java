package emberline.place.standard;

/**
 * How well a standard, or the sum of two, fits an object.
 *
 * @param first the standard, or the earlier of two
 * @param second the later of two; the same as the first for a single one
 * @param isPair whether it is a sum of two
 * @param scale factor of the first
 * @param secondScale factor of the second; 0 for a single one
 * @param chiSquare weighted sum of squares
 * @param degreesOfFreedom bins less free scales
 */
public record StandardMatch(
        Standard first,
        Standard second,
        boolean isPair,
        double scale,
        double secondScale,
        double chiSquare,
        int degreesOfFreedom) {

    /**
     * The reduced chi-square.
     *
     * @return chi-square over the degrees of freedom
     */
    public double reducedChiSquare() {
        return chiSquare / degreesOfFreedom;
    }
}
