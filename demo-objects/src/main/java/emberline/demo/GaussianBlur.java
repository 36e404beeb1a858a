package emberline.demo;

/**
 * Convolution with a normal curve on an evenly spaced grid; the curve is renormalised at the ends.
 */
final class GaussianBlur {

    private static final double REACH_SIGMAS = 5;

    private GaussianBlur() {}

    /**
     * Smooths values.
     *
     * @param values on an evenly spaced grid
     * @param sigma standard deviation in steps of the grid, positive
     * @return smoothed values, as many
     */
    static double[] blur(double[] values, double sigma) {
        int reach = (int) Math.ceil(REACH_SIGMAS * sigma);
        double[] kernel = new double[reach + 1];
        for (int k = 0; k <= reach; k++) {
            kernel[k] = StrictMath.exp(-0.5 * (k / sigma) * (k / sigma));
        }
        double[] smooth = new double[values.length];
        for (int i = 0; i < values.length; i++) {
            double sum = 0;
            double weights = 0;
            int last = Math.min(values.length - 1, i + reach);
            for (int j = Math.max(0, i - reach); j <= last; j++) {
                double weight = kernel[Math.abs(i - j)];
                sum += weight * values[j];
                weights += weight;
            }
            smooth[i] = sum / weights;
        }
        return smooth;
    }
}
