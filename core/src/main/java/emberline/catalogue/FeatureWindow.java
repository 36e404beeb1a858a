package emberline.catalogue;

/**
 * A window of a feature and what it is there for.
 *
 * @param role what the window is to the form of the feature
 * @param window the interval (micron, vacuum)
 * @param weight factor of the window mean in a weighted sum, positive; 1 in other forms
 * @param exponent power of the window mean in a product of powers, not zero; 1 in other forms
 */
public record FeatureWindow(Role role, Window window, double weight, double exponent) {

    /** Checks weight and exponent. */
    public FeatureWindow {
        if (!(weight > 0) || Double.isInfinite(weight)) {
            throw new IllegalArgumentException(
                    "weight " + weight + ": expected a positive, finite number");
        }
        if (!(Math.abs(exponent) > 0) || Double.isInfinite(exponent)) {
            throw new IllegalArgumentException(
                    "exponent " + exponent + ": expected a finite number other than 0");
        }
    }
}
