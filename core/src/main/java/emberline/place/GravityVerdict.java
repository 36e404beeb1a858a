package emberline.place;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The gravity class by the published low-resolution scores.
 *
 * @param gravityClass the class as the published scheme gives it; empty where it is not judged
 * @param pFieldGravity probability of FLD-G with noise and type uncertainty carried through, 0 to
 *     1; empty where the class is not judged
 * @param pIntermediateGravity probability of INT-G
 * @param pVeryLowGravity probability of VL-G
 * @param reason why the class is not judged; empty where it is
 * @param scores the features of the scheme, scored or not
 */
public record GravityVerdict(
        Optional<GravityClass> gravityClass,
        OptionalDouble pFieldGravity,
        OptionalDouble pIntermediateGravity,
        OptionalDouble pVeryLowGravity,
        String reason,
        List<GravityScore> scores) {

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
                scores);
    }
}
