package emberline.place.kind;

/** Shares of the kinds: not negative, adding up to 1. */
final class Shares {

    private Shares() {}

    /**
     * Raises shares to a power and makes them add up to 1 again.
     *
     * @param weights shares, or what is in proportion to them; changed in place
     * @param exponent positive; above 1 the greatest share grows, below 1 it shrinks
     */
    static void sharpen(double[] weights, double exponent) {
        double sum = 0;
        for (int kind = 0; kind < weights.length; kind++) {
            weights[kind] = Math.pow(weights[kind], exponent);
            sum += weights[kind];
        }
        divide(weights, sum);
    }

    /**
     * Turns logarithms into shares of the known kinds that add up to 1, 0 for the others.
     *
     * @param logs logarithms of weights; changed in place
     * @param known the kinds that get a share
     * @return the logarithm of what the shares were divided by
     */
    static double fromLogarithms(double[] logs, boolean[] known) {
        double most = Double.NEGATIVE_INFINITY;
        for (int kind = 0; kind < logs.length; kind++) {
            most = known[kind] ? Math.max(most, logs[kind]) : most;
        }
        double sum = 0;
        for (int kind = 0; kind < logs.length; kind++) {
            logs[kind] = known[kind] ? Math.exp(logs[kind] - most) : 0;
            sum += logs[kind];
        }
        divide(logs, sum);
        return most + Math.log(sum);
    }

    private static void divide(double[] weights, double sum) {
        for (int kind = 0; kind < weights.length; kind++) {
            weights[kind] /= sum;
        }
    }
}
