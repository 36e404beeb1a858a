package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

class EstimateTest {

    private static void assertNear(
            double lo95, double lo68, double median, double hi68, double hi95, Estimate found) {
        assertEquals(lo95, found.lo95(), 1e-9, "lo95");
        assertEquals(lo68, found.lo68(), 1e-9, "lo68");
        assertEquals(median, found.median(), 1e-9, "median");
        assertEquals(hi68, found.hi68(), 1e-9, "hi68");
        assertEquals(hi95, found.hi95(), 1e-9, "hi95");
    }

    /** One and 1.96 sigma either side of the mean. */
    @Test
    void normalErrorsHaveTheIntervalsOfTheNormalDistribution() {
        Estimate normal = Estimate.normal(5, 2);
        assertNear(5 - 3.919927969080108, 3, 5, 7, 5 + 3.919927969080108, normal);
        assertEquals(2, normal.sigma(), 1e-12);
        assertNear(-29.19927969080108, -10, 10, 30, 49.19927969080108, Estimate.normal(10, 20));
    }

    /** Weight is even over a cell, so the quantiles of one cell are those of an even spread. */
    @Test
    void quantilesOfOneCellDivideIt() {
        assertNear(
                0.25,
                1.5865525,
                5,
                8.4134475,
                9.75,
                Estimate.of(new double[] {0, 10}, new double[] {3}));
    }

    /** Half of the weight below 1, half above 2, nothing between: the median is the lower edge. */
    @Test
    void anEmptyCellHoldsNoQuantile() {
        assertNear(
                0.05,
                0.317310500,
                1,
                2.682689500,
                2.95,
                Estimate.of(new double[] {0, 1, 2, 3}, new double[] {1, 0, 1}));
        assertNear(
                1.025,
                1.15865525,
                1.5,
                1.84134475,
                1.975,
                Estimate.of(new double[] {0, 1, 2, 3}, new double[] {0, 7, 0}));
    }

    @Test
    void anotherUnitMultipliesEveryNumber() {
        Estimate times = new Estimate(5, 4, 7, 2, 11).times(10);
        assertEquals(new Estimate(50, 40, 70, 20, 110), times);
        assertEquals(15, times.sigma());
    }

    @Test
    void numbersOutOfOrderAreRefused() {
        double[][] wrong = {
            {5, 6, 7, 2, 11}, {5, 4, 4.5, 2, 11}, {5, 4, 7, 4.5, 11}, {5, 4, 7, 2, 6}
        };
        for (double[] w : wrong) {
            IllegalArgumentException refused =
                    assertThrows(
                            IllegalArgumentException.class,
                            () -> new Estimate(w[0], w[1], w[2], w[3], w[4]));
            assertTrue(refused.getMessage().contains("ordered"), refused.getMessage());
        }
        assertEquals(3, new Estimate(3, 3, 3, 3, 3).median());
    }

    /** 2 pc of 68% interval about 10 pc, on either side. */
    @Test
    void theRelativeErrorOfADistanceIsByTheMedian() {
        assertEquals(
                0.2,
                new DistanceEstimate(Estimate.normal(10, 2), "parallax").relativeSigma(),
                1e-12);
    }

    @Test
    void weightsWithoutAPositiveSumAreRefused() {
        double[] edges = {0, 1, 2};
        for (double[] weights :
                new double[][] {{0, 0}, {1, Double.NaN}, {1, Double.POSITIVE_INFINITY}}) {
            IllegalArgumentException refused =
                    assertThrows(IllegalArgumentException.class, () -> Estimate.of(edges, weights));
            assertTrue(
                    refused.getMessage().endsWith("expected a positive finite sum"),
                    refused.getMessage());
        }
    }
}
