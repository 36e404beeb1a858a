package emberline.place.calibrated;

/**
 * The logarithm of a product of positive numbers. Most of them cost a multiplication only; a
 * logarithm is taken where the product would leave the range of numbers, and at the end.
 */
final class LogProduct {

    private static final double LARGE = 1e100;
    private static final double SMALL = 1e-100;

    private double product = 1;
    private double log;

    /** Takes one more factor, positive. */
    void times(double factor) {
        product *= factor;
        if (!(product < LARGE && product > SMALL)) {
            log += Math.log(product);
            product = 1;
        }
    }

    /** The natural logarithm of all factors together. */
    double value() {
        return log + Math.log(product);
    }
}
