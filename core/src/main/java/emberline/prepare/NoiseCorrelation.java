package emberline.prepare;

import java.util.Arrays;

/**
 * How neighbouring pixels share their noise, from the second differences of the fluxes in units of
 * the noise. For noise with the correlations r1 and r2 at lags one and two, and none beyond, the
 * second differences have
 *
 * <pre>
 *   variance            6 - 8 r1 + 2 r2
 *   covariance at lag 1 -4 + 7 r1 - 4 r2
 *   covariance at lag 2  1 - 4 r1 + 6 r2
 * </pre>
 *
 * in units of the noise variance, so that the two ratios of covariance to variance give r1 and r2.
 * Spectral structure that a few pixels resolve looks like shared noise; the estimate is therefore
 * good only where noise rules the second differences.
 *
 * <p>Correlations that stop at lag two are those of some noise only where the power 1 + 2 r1 cos t
 * + 2 r2 cos 2t is nowhere negative; estimates outside are moved to the nearest r2 that allows it.
 *
 * @param lag1 correlation of neighbours, 0 to {@value #MOST_LAG1}
 * @param lag2 correlation of next-but-one neighbours, 0 to {@value #MOST_LAG2}
 */
record NoiseCorrelation(double lag1, double lag2) {

    static final double MOST_LAG1 = 0.70;
    static final double MOST_LAG2 = 0.45;

    static final NoiseCorrelation NONE = new NoiseCorrelation(0, 0);

    /** Allowance for rounding in the power. */
    private static final double ROUNDING = 1e-9;

    /** Second differences beyond this many times their median size are lines or bad pixels. */
    private static final double CLIP = 5;

    private static final double INDEPENDENT = 0.01;

    /** Fewer second differences than this say nothing. */
    private static final int LEAST_PIXELS = 50;

    /** Sampling error of the first correlation, times the root of the number of pixels. */
    private static final double INVERSION = 3;

    /** Correlations below this many times their sampling error are not told from zero. */
    private static final double SIGNIFICANT = 3;

    /**
     * Estimates the correlation of the noise.
     *
     * @param flux fluxes; NaN marks bad pixels
     * @param sigma one-sigma noise
     * @return the correlations; none where they are not told from zero
     */
    static NoiseCorrelation of(double[] flux, double[] sigma) {
        double[] second = new double[flux.length];
        Arrays.fill(second, Double.NaN);
        for (int i = 1; i < flux.length - 1; i++) {
            second[i] = (flux[i - 1] - 2 * flux[i] + flux[i + 1]) / sigma[i];
        }
        double[] sizes =
                Arrays.stream(second).filter(Double::isFinite).map(Math::abs).sorted().toArray();
        if (sizes.length < LEAST_PIXELS) {
            return NONE;
        }
        double limit = CLIP * sizes[sizes.length / 2];
        double variance = mean(second, 0, limit);
        double ratio1 = mean(second, 1, limit) / variance;
        double ratio2 = mean(second, 2, limit) / variance;
        double a = 7 + 8 * ratio1;
        double b = -4 - 2 * ratio1;
        double c = -4 + 8 * ratio2;
        double d = 6 - 2 * ratio2;
        double determinant = a * d - b * c;
        double lag1 = ((4 + 6 * ratio1) * d - b * (6 * ratio2 - 1)) / determinant;
        double lag2 = (a * (6 * ratio2 - 1) - c * (4 + 6 * ratio1)) / determinant;
        double error = INVERSION / Math.sqrt(sizes.length);
        if (!(lag1 > SIGNIFICANT * error)) {
            return NONE;
        }
        return withSomeIndependent(possible(lag1, lag2));
    }

    /**
     * At the edge of what is possible the noise has no power at some frequency, and rounding makes
     * the covariance of many windows negative. A share of {@value #INDEPENDENT} of the noise is
     * independent then.
     */
    private static NoiseCorrelation withSomeIndependent(NoiseCorrelation edge) {
        double kept = 1 - INDEPENDENT;
        return isPossible(edge.lag1 / kept, edge.lag2 / kept)
                ? edge
                : new NoiseCorrelation(edge.lag1 * kept, edge.lag2 * kept);
    }

    /**
     * The correlations nearest to an estimate that noise can have: r1 is cut at {@value
     * #MOST_LAG1}, then r2 is moved into the range that this r1 allows. The lower end of that range
     * is r1 - 1/2 up to r1 = 2/3; beyond, and at the upper end, it is where 1 - 2 r2 - r1^2 / (4
     * r2) = 0.
     */
    static NoiseCorrelation possible(double lag1, double lag2) {
        double first = Math.max(0, Math.min(lag1, MOST_LAG1));
        double root = Math.sqrt(1 - 2 * first * first);
        double least = first <= 2.0 / 3 ? Math.max(0, first - 0.5) : (1 - root) / 4;
        double most = Math.min((1 + root) / 4, Math.min(MOST_LAG2, first * first + 0.1));
        return new NoiseCorrelation(first, Math.max(least, Math.min(lag2, most)));
    }

    /**
     * Whether noise can have these correlations and none beyond: its power is nowhere negative.
     *
     * @param lag1 correlation of neighbours
     * @param lag2 correlation of next-but-one neighbours
     * @return false also for NaN
     */
    static boolean isPossible(double lag1, double lag2) {
        double least = 1 + 2 * lag2 - 2 * Math.abs(lag1);
        if (Math.abs(lag1) < 4 * lag2) {
            least = Math.min(least, 1 - 2 * lag2 - lag1 * lag1 / (4 * lag2));
        }
        return least >= -ROUNDING;
    }

    /** Mean product of second differences at a lag, over those that are not outliers. */
    private static double mean(double[] second, int lag, double limit) {
        double sum = 0;
        int count = 0;
        for (int i = 0; i + lag < second.length; i++) {
            if (Math.abs(second[i]) < limit && Math.abs(second[i + lag]) < limit) {
                sum += second[i] * second[i + lag];
                count++;
            }
        }
        return sum / count;
    }

    /**
     * Factor by which a sigma from second differences of independent pixels is too small; finite.
     */
    double scatterDeficit() {
        return Math.sqrt(6 / (6 - 8 * lag1 + 2 * lag2));
    }

    /** The same for third differences, whose variance is 20 - 30 r1 + 12 r2. */
    double thirdDeficit() {
        return Math.sqrt(20 / (20 - 30 * lag1 + 12 * lag2));
    }
}
