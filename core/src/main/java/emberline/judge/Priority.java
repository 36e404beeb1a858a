package emberline.judge;

import java.util.Map;

/**
 * Where an object stands in the order of a survey.
 *
 * @param score the greater, the earlier: over the aims, weight times probability of the claim times
 *     what the best further observation would add (bit), plus 0.05 so that objects that are already
 *     decided keep their order
 * @param pByAim probability of the claim of each aim, for all aims that could be judged
 * @param reason in words
 */
public record Priority(double score, Map<Aim, Double> pByAim, String reason) {

    /** What an object is worth that no further observation could tell more of. */
    static final double FLOOR_BITS = 0.05;

    /** Copies the map. */
    public Priority {
        pByAim = Map.copyOf(pByAim);
    }
}
