package emberline.judge;

/**
 * A quantity with its intervals, from a posterior.
 *
 * @param median the median
 * @param lo68 lower end of the central 68% interval
 * @param hi68 upper end of it
 * @param lo95 lower end of the central 95% interval
 * @param hi95 upper end of it
 */
public record Estimate(double median, double lo68, double hi68, double lo95, double hi95) {

    private static final double NORMAL_95 = 1.959963984540054;
    private static final double[] SHARES = {0.025, 0.15865525, 0.5, 0.84134475, 0.975};

    /** Checks the order of the numbers. */
    public Estimate {
        if (!(lo95 <= lo68 && lo68 <= median && median <= hi68 && hi68 <= hi95)) {
            throw new IllegalArgumentException(
                    "estimate " + median + ": expected ordered intervals");
        }
    }

    /**
     * A quantity with normal errors.
     *
     * @param mean best value
     * @param sigma one-sigma error, not negative
     * @return the estimate
     */
    public static Estimate normal(double mean, double sigma) {
        return new Estimate(
                mean,
                mean - sigma,
                mean + sigma,
                mean - NORMAL_95 * sigma,
                mean + NORMAL_95 * sigma);
    }

    /**
     * Quantiles of weights in neighbouring cells; weight is even over a cell.
     *
     * @param edges edges of the cells, increasing, one more than weights
     * @param weights not negative, with a positive sum
     * @return the estimate
     * @throws IllegalArgumentException if the sum is not positive and finite
     */
    static Estimate of(double[] edges, double[] weights) {
        double sum = 0;
        for (double weight : weights) {
            sum += weight;
        }
        if (!(sum > 0) || Double.isInfinite(sum)) {
            throw new IllegalArgumentException(
                    "weights with the sum " + sum + ": expected a positive finite sum");
        }
        double[] at = new double[SHARES.length];
        double below = 0;
        int next = 0;
        for (int i = 0; next < at.length; i++) {
            double share = weights[i] / sum;
            while (next < at.length && below + share >= SHARES[next] && share > 0) {
                at[next] = edges[i] + (edges[i + 1] - edges[i]) * (SHARES[next] - below) / share;
                next++;
            }
            below += share;
        }
        return new Estimate(at[2], at[1], at[3], at[0], at[4]);
    }

    /**
     * Half of the 68% interval.
     *
     * @return one sigma
     */
    public double sigma() {
        return (hi68 - lo68) / 2;
    }

    /**
     * The same estimate in another unit.
     *
     * @param factor positive
     * @return every number multiplied
     */
    public Estimate times(double factor) {
        return new Estimate(
                median * factor, lo68 * factor, hi68 * factor, lo95 * factor, hi95 * factor);
    }
}
