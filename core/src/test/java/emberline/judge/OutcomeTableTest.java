package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;

class OutcomeTableTest {

    private static Decision byFirst(double[] p) {
        return Limits.decide(p[0], p[0], Judging.withDefaults());
    }

    private static double change(double[][] joint) {
        return new OutcomeTable(joint).change(OutcomeTableTest::byFirst);
    }

    /** The first kind has 0.5 before; 0.96 after the first outcome, 0.04 after the second. */
    @Test
    void bothOutcomesCanDecide() {
        assertEquals(1, change(new double[][] {{0.48, 0.02}, {0.02, 0.48}}), 1e-12);
    }

    /** 0.96 after an outcome of 0.25, 0.347 after the other: only the first decides. */
    @Test
    void anOutcomeThatLeavesTheQuestionOpenChangesNothing() {
        double[][] joint = {{0.24, 0.26}, {0.01, 0.49}};
        assertEquals(0.25, change(joint), 1e-12);
        double[][] fourTimes = {{0.96, 1.04}, {0.04, 1.96}};
        assertEquals(0.25, change(fourTimes), 1e-12);
    }

    @Test
    void outcomesThatNeverComeCountNothing() {
        double[][] joint = {{0.24, 0, 0.26}, {0.01, 0, 0.49}};
        assertEquals(0.25, change(joint), 1e-12);
        assertEquals(
                0, new OutcomeTable(new double[2][3]).information(new boolean[] {true, false}));
        assertEquals(0, change(new double[2][3]));
    }

    /** Three kinds, two of them answered with yes: those two count as one. */
    @Test
    void kindsWithOneAnswerAreOne() {
        double[][] joint = {{0.2, 0.05}, {0.25, 0}, {0.05, 0.45}};
        // yes 0.5: 0.45 and 0.05 by outcome; no 0.5: 0.05 and 0.45; 1 - H(0.1) = 0.5310
        assertEquals(
                0.5310044,
                new OutcomeTable(joint).information(new boolean[] {true, true, false}),
                1e-7);
    }
}
