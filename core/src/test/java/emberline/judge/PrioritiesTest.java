package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/** What a further observation is worth, and the place in a survey that follows from it. */
class PrioritiesTest {

    private static NextStep step(FollowUp what, Aim aim, double bits, double change) {
        return new NextStep(
                what,
                what.name().toLowerCase(java.util.Locale.ROOT),
                aim,
                bits,
                change,
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                "");
    }

    private static final List<NextStep> STEPS =
            List.of(
                    step(FollowUp.PARALLAX, Aim.SUBSTELLAR, 0.1, 0.2),
                    step(FollowUp.LITHIUM, Aim.SUBSTELLAR, 0.3, 0.2),
                    step(FollowUp.VELOCITY, Aim.SUBSTELLAR, 0.9, 0.001),
                    step(FollowUp.POTASSIUM, Aim.YOUNG, 0.5, 0.3));

    @Test
    void whatTellsLittleOrCannotChangeTheDecisionIsNotRecommended() {
        assertTrue(step(FollowUp.LITHIUM, Aim.YOUNG, 0.02, 0.01).isRecommended());
        assertFalse(step(FollowUp.LITHIUM, Aim.YOUNG, 0.0199, 1).isRecommended());
        assertFalse(step(FollowUp.LITHIUM, Aim.YOUNG, 1, 0.0099).isRecommended());
    }

    /** Weight times claim times (0.05 + the best recommended gain): 0.4 (0.35) + 2 (0.1)(0.55). */
    @Test
    void theScoreAddsTheAims() {
        Judging both = Judging.withDefaults().withAims(Aim.parse("substellar,young=2"));
        Priority priority = Priorities.of(Map.of(Aim.SUBSTELLAR, 0.4, Aim.YOUNG, 0.1), STEPS, both);
        assertEquals(0.4 * 0.35 + 2 * 0.1 * 0.55, priority.score(), 1e-12);
        assertEquals(
                "substellar 0.40, lithium adds 0.30 bit; younger than 150 Myr 0.10, potassium adds"
                        + " 0.50 bit",
                priority.reason());
    }

    @Test
    void anAimThatWasNotJudgedAddsNothing() {
        Judging both = Judging.withDefaults().withAims(Aim.parse("nearby,coolest"));
        Priority priority = Priorities.of(Map.of(Aim.COOLEST, 0.8), STEPS, both);
        assertEquals(0.8 * 0.05, priority.score(), 1e-12);
        assertEquals(
                "cooler than 1300 K 0.80, no further observation would change the decision;"
                        + " nearby: not judged",
                priority.reason());
    }

    /** Recommended first, then by gain times the weight of the aim. */
    @Test
    void stepsAreSortedByTheirWeightedGain() {
        Judging both = Judging.withDefaults().withAims(Aim.parse("substellar=2,young"));
        assertEquals(
                List.of(FollowUp.LITHIUM, FollowUp.POTASSIUM, FollowUp.PARALLAX, FollowUp.VELOCITY),
                NextSteps.sorted(STEPS, both).stream().map(NextStep::observation).toList());
    }

    /** Ten times its error and more is a parallax that needs no other. */
    @Test
    void aParallaxOfTenSigmaIsGood() {
        assertTrue(NextSteps.hasGoodParallax(Astrometry.ofParallax(50, 5)));
        assertFalse(NextSteps.hasGoodParallax(Astrometry.ofParallax(50, 5.1)));
        assertFalse(NextSteps.hasGoodParallax(Astrometry.none()));
    }
}
