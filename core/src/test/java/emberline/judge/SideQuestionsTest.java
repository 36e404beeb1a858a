package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class SideQuestionsTest {

    private static final JudgeNumbers NUMBERS = JudgeNumbers.standard();
    private static final AgeEvidence AGE = new AgeEvidence(NUMBERS);
    private static final Evidence L2 = Evidence.ofType(12, 0.5, Optional.empty());

    private final SideQuestions questions =
            new SideQuestions(
                    NUMBERS,
                    AGE,
                    new NextSteps(
                            new TypeKernel(new PropertyRelations()), new LithiumEvidence(NUMBERS)));

    private static DistanceEstimate distance(double pc, double sigma) {
        return new DistanceEstimate(Estimate.normal(pc, sigma), "parallax");
    }

    /**
     * The share below 20 pc of a log-normal: the normal distribution of ln(20 / d) by its error.
     */
    @ParameterizedTest
    @CsvSource({"20, 2, 0.5", "18.0967, 1.80967, 0.8413", "24.4281, 4.88562, 0.1587", "5, 0.5, 1"})
    void nearbyIsTheShareWithinTwentyParsec(double pc, double sigma, double share) {
        // 81 points of four sigma: a step is a tenth of a sigma
        assertEquals(
                share, questions.nearby(Optional.of(distance(pc, sigma))).orElseThrow(), 0.025);
    }

    @Test
    void withoutADistanceNothingIsNearby() {
        assertTrue(questions.nearby(Optional.empty()).isEmpty());
    }

    /** Bayes with the odds of the velocity; without a motion the spectrum or the local share. */
    @Test
    void metalPoorByBayes() {
        assertEquals(0.026, questions.metalPoor(L2, Optional.empty(), Optional.empty(), 12), 1e-12);
        assertEquals(
                0.3,
                questions.metalPoor(L2.withMetalPoor(0.3), Optional.empty(), Optional.empty(), 12),
                1e-12);
        double odds = 0.3 / 0.7 * AGE.metalPoorFactor(250, 0.1, 12);
        assertEquals(
                odds / (1 + odds),
                questions.metalPoor(
                        L2.withMetalPoor(0.3),
                        Optional.of(new Kinematics(250, 25, Optional.empty())),
                        Optional.of(distance(100, 10)),
                        12),
                1e-12);
    }

    private List<NextStep> steps(
            Evidence evidence, Optional<DistanceEstimate> distance, String aims) {
        return questions.steps(
                0.3,
                0.2,
                distance,
                evidence,
                new TypeMix(evidence),
                Judging.withDefaults().withAims(Aim.parse(aims)));
    }

    private static double entropy(double p) {
        return -(p * Math.log(p) + (1 - p) * Math.log(1 - p)) / Math.log(2);
    }

    /**
     * A spectrum that is right nine times in ten on p = 0.3; images that part half of the pairs.
     */
    @Test
    void gainsAreThoseOfTheirChannels() {
        List<NextStep> found = steps(L2, Optional.empty(), "metal-poor,pairs,nearby");
        assertEquals(
                List.of(FollowUp.METALLICITY, FollowUp.IMAGING),
                found.stream().map(NextStep::observation).toList());
        double yes = 0.3 * 0.9 + 0.7 * 0.1;
        double metallicity =
                entropy(0.3) - yes * entropy(0.27 / yes) - (1 - yes) * entropy(0.03 / (1 - yes));
        assertEquals(metallicity, found.get(0).gainBits(), 1e-9);
        assertEquals(entropy(0.2) - 0.9 * entropy(0.1 / 0.9), found.get(1).gainBits(), 1e-9);
        assertEquals(0.1, found.get(1).pChange(), 1e-9, "seen as a pair");
        assertEquals(1 - yes, found.get(0).pChange(), 1e-9, "0.045 metal-poor is decided");
    }

    /** A distance of 30% about 20 pc is open; a parallax of a tenth settles most of it. */
    @Test
    void aParallaxTellsWhetherItIsNear() {
        NextStep parallax = steps(L2, Optional.of(distance(20, 6)), "nearby").get(0);
        assertEquals(FollowUp.PARALLAX, parallax.observation());
        assertTrue(parallax.gainBits() > 0.5 && parallax.gainBits() < 0.9, parallax.toString());
        NextStep sure = steps(L2, Optional.of(distance(5, 0.5)), "nearby").get(0);
        assertEquals(0, sure.gainBits(), 1e-9);
        assertTrue(
                steps(
                                L2.withAstrometry(Astrometry.ofParallax(50, 1)),
                                Optional.of(distance(20, 0.4)),
                                "nearby")
                        .isEmpty());
        assertTrue(steps(L2, Optional.of(distance(20, 6)), "substellar").isEmpty());
    }
}
