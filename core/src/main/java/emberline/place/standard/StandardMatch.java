package emberline.place.standard;

import java.util.Optional;

/**
 * How well a standard, or the sum of two, fits an object.
 *
 * @param first the standard, or the earlier of two
 * @param second the later of two; empty for a single one
 * @param scale factor of the first
 * @param secondScale factor of the second; 0 for a single one
 * @param chiSquare weighted sum of squares
 * @param degreesOfFreedom bins less free scales
 */
public record StandardMatch(
        Standard first,
        Optional<Standard> second,
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
