package emberline.place;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The gravity class: the most probable one of the posterior where the calibrated witness can tell,
 * else that of the published low-resolution scores.
 *
 * @param gravityClass the adopted class; empty where it is not judged
 * @param pFieldGravity probability of FLD-G with noise and type uncertainty carried through, 0 to
 *     1; empty where the class is not judged
 * @param pIntermediateGravity probability of INT-G
 * @param pVeryLowGravity probability of VL-G
 * @param reason why the class is not judged; empty where it is
 * @param scores the features of the published scheme, scored or not
 * @param byScores the class as the published scheme gives it, the type taken as known; empty where
 *     the scheme does not apply
 */
public record GravityVerdict(
        Optional<GravityClass> gravityClass,
        OptionalDouble pFieldGravity,
        OptionalDouble pIntermediateGravity,
        OptionalDouble pVeryLowGravity,
        String reason,
        List<GravityScore> scores,
        Optional<GravityClass> byScores) {

    /** Copies the list. */
    public GravityVerdict {
        scores = List.copyOf(scores);
    }

    /**
     * A verdict that could not be reached.
     *
     * @param reason why
     * @param scores the features of the scheme as far as measured
     * @return a verdict without class and probabilities
     */
    public static GravityVerdict notJudged(String reason, List<GravityScore> scores) {
        return new GravityVerdict(
                Optional.empty(),
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                reason,
                scores,
                Optional.empty());
    }

    /**
     * The probability of a class.
     *
     * @param gravity the class
     * @return 0 to 1, or empty where the class is not judged
     */
    public OptionalDouble probability(GravityClass gravity) {
        return switch (gravity) {
            case FLD_G -> pFieldGravity;
            case INT_G -> pIntermediateGravity;
            case VL_G -> pVeryLowGravity;
        };
    }

    /**
     * The probability of the adopted class.
     *
     * @return 0 to 1, or empty where no class is adopted
     */
    public OptionalDouble pOfClass() {
        return gravityClass.map(this::probability).orElseGet(OptionalDouble::empty);
    }
}
