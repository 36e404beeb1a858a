package emberline.measure;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.function.DoublePredicate;
import org.apache.commons.math3.stat.correlation.PearsonsCorrelation;
import org.apache.commons.math3.stat.descriptive.moment.Kurtosis;
import org.apache.commons.math3.stat.descriptive.moment.Skewness;
import org.apache.commons.math3.stat.descriptive.moment.StandardDeviation;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.junit.jupiter.api.Test;

/** Deviates against the normal distribution of Apache Commons Statistics. */
class NormalDeviatesTest {

    private static final int SIZE = 2_000_000;
    private static final NormalDistribution NORMAL = NormalDistribution.of(0, 1);

    private static double[] deviates(long seed, int stream, int size) {
        double[] deviates = new double[size];
        new NormalDeviates(seed, stream).fill(deviates, size);
        return deviates;
    }

    @Test
    void theMomentsAreThoseOfTheNormalDistribution() {
        double[] deviates = deviates(1, 0, SIZE);
        assertEquals(0, Arrays.stream(deviates).average().orElseThrow(), 4 / Math.sqrt(SIZE));
        assertEquals(1, new StandardDeviation().evaluate(deviates), 4 / Math.sqrt(2.0 * SIZE));
        assertEquals(0, new Skewness().evaluate(deviates), 4 * Math.sqrt(6.0 / SIZE));
        assertEquals(0, new Kurtosis().evaluate(deviates), 4 * Math.sqrt(24.0 / SIZE));
    }

    /** Kolmogorov-Smirnov; a distance above 1.95 over the root of n has a chance of 0.1%. */
    @Test
    void theDistributionIsNormal() {
        double[] sorted = deviates(2, 5, SIZE);
        Arrays.sort(sorted);
        double distance = 0;
        for (int k = 0; k < SIZE; k++) {
            double expected = NORMAL.cumulativeProbability(sorted[k]);
            distance = Math.max(distance, Math.abs(expected - (k + 0.5) / SIZE));
        }
        assertTrue(distance < 1.95 / Math.sqrt(SIZE), "distance " + distance);
    }

    /** The tail beyond 3.65 has a method of its own, and every strip an edge. */
    @Test
    void theTailsAreNormal() {
        double[] deviates = deviates(3, 1, SIZE);
        for (double limit : new double[] {3, 3.5, 3.8, 4.2}) {
            double expected = SIZE * NORMAL.survivalProbability(limit);
            assertEquals(expected, count(deviates, d -> d > limit), 4 * Math.sqrt(expected));
            assertEquals(expected, count(deviates, d -> d < -limit), 4 * Math.sqrt(expected));
        }
    }

    private static double count(double[] deviates, DoublePredicate which) {
        return Arrays.stream(deviates).filter(which).count();
    }

    @Test
    void streamsAndNeighboursAreIndependent() {
        int size = 200_000;
        double[] one = deviates(4, 0, size);
        double[] other = deviates(4, 1, size);
        double[] otherSeed = deviates(5, 0, size);
        double allowed = 4 / Math.sqrt(size);
        assertEquals(0, correlation(one, other), allowed);
        assertEquals(0, correlation(one, otherSeed), allowed);
        double[] squares = Arrays.stream(one).map(d -> d * d).toArray();
        for (int lag : new int[] {1, 2, 250}) {
            assertEquals(
                    0,
                    correlation(Arrays.copyOf(one, size - lag), Arrays.copyOfRange(one, lag, size)),
                    allowed);
            assertEquals(
                    0,
                    correlation(
                            Arrays.copyOf(squares, size - lag),
                            Arrays.copyOfRange(squares, lag, size)),
                    allowed);
        }
    }

    private static double correlation(double[] a, double[] b) {
        return new PearsonsCorrelation().correlation(a, b);
    }

    @Test
    void theSequenceDoesNotDependOnHowItIsCut() {
        double[] whole = deviates(6, 2, 301);
        NormalDeviates sequence = new NormalDeviates(6, 2);
        double[] first = new double[100];
        double[] rest = new double[201];
        sequence.fill(first, 100);
        sequence.fill(rest, 201);
        assertArrayEquals(Arrays.copyOf(whole, 100), first);
        assertArrayEquals(Arrays.copyOfRange(whole, 100, 301), rest);
    }
}
