package emberline.judge;

import java.util.OptionalDouble;

/**
 * What a further observation would add to the question of an aim.
 *
 * @param observation the observation
 * @param label the observation in words
 * @param aim whose question
 * @param gainBits expected information about it (bit): mutual information of question and outcome,
 *     0 to 1
 * @param pChange probability that the decision is another one afterwards
 * @param resolvingPower least resolving power; empty where it is no spectrum
 * @param snr least signal-to-noise; empty where it does not apply
 * @param cost what it costs, in words
 */
public record NextStep(
        FollowUp observation,
        String label,
        Aim aim,
        double gainBits,
        double pChange,
        OptionalDouble resolvingPower,
        OptionalDouble snr,
        String cost) {

    /** Probability of another decision below which an observation is not recommended. */
    private static final double CAN_CHANGE = 0.01;

    /** Information (bit) below which an observation is not recommended. */
    private static final double WORTH_BITS = 0.02;

    /**
     * Whether it is worth making: it can change the decision, and it tells something.
     *
     * @return false where the decision would stand whatever comes out
     */
    public boolean isRecommended() {
        return pChange >= CAN_CHANGE && gainBits >= WORTH_BITS;
    }
}
