package emberline.judge;

/**
 * On which side of the limits the mass lies.
 *
 * @param pSubstellarLow probability of a mass below the lowest hydrogen-burning limit (0.070 solar)
 * @param pSubstellar the same for the limit in the middle (0.072 solar)
 * @param pSubstellarHigh the same for the highest (0.075 solar)
 * @param pPlanetaryMass probability of a mass below the deuterium-burning limit (13 Jupiter masses)
 * @param decision the decision by the thresholds, the same at all three limits
 */
public record Limits(
        double pSubstellarLow,
        double pSubstellar,
        double pSubstellarHigh,
        double pPlanetaryMass,
        Decision decision) {

    static Limits of(NodePosterior posterior, JudgeNumbers numbers, Judging judging) {
        double low = posterior.below(numbers.of("hydrogen-limit-low"));
        double middle = posterior.below(numbers.of("hydrogen-limit"));
        double high = posterior.below(numbers.of("hydrogen-limit-high"));
        return new Limits(
                low,
                middle,
                high,
                posterior.below(numbers.of("deuterium-limit")),
                decide(low, high, judging));
    }

    /** The decision where all limits agree; the probability rises with the limit. */
    static Decision decide(double pLow, double pHigh, Judging judging) {
        if (pLow >= judging.substellarFrom()) {
            return Decision.SUBSTELLAR;
        }
        return pHigh <= judging.stellarTo() ? Decision.STELLAR : Decision.UNDECIDED;
    }
}
