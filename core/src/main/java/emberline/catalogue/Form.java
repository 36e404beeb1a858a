package emberline.catalogue;

/**
 * How a feature is computed. Below, m is the mean (or median) of the flux density per unit
 * wavelength over a window.
 */
public enum Form {
    /** m(NUMERATOR) / m(DENOMINATOR). */
    RATIO_OF_MEANS,
    /** Sum of w m over the numerators / sum of w m over the denominators; w as printed. */
    RATIO_OF_WEIGHTED_SUMS,
    /** (a - b) / (0.5 (a + b)), a = m(BAND_A), b = m(BAND_B). */
    NORMALISED_DIFFERENCE,
    /** (m(NUMERATOR_1) / m(DENOMINATOR_1)) / (m(NUMERATOR_2) / m(DENOMINATOR_2)). */
    DOUBLE_RATIO,
    /** Product of m to the power of its exponent; the exponents sum to zero. */
    PRODUCT_OF_POWERS,
    /** -2.5 log10(m(NUMERATOR) / m(DENOMINATOR)). */
    MAGNITUDE_OF_RATIO,
    /**
     * The straight line through the two continua, at the centre of LINE, divided by m(LINE); a
     * continuum stands at the centre of its window.
     */
    INTERPOLATED_CONTINUUM_OVER_LINE,
    /**
     * Integral of 1 - F/C over LINE (angstrom); C is the straight line through the m of the two
     * continua, each at the centre of its window.
     */
    EQUIVALENT_WIDTH_LINEAR_CONTINUUM,
    /** Integral of 1 - F/C over LINE (angstrom); C is the mean of the m of the continua. */
    EQUIVALENT_WIDTH_MEAN_CONTINUUM,
    /**
     * Integral of 1 - F/C over LINE (angstrom); C is the straight line of least squares through the
     * m of the continua, of equal weight, each at the centre of its window.
     */
    EQUIVALENT_WIDTH_FITTED_CONTINUUM,
    /** Sum of the TERM features. */
    SUM_OF_FEATURES,
    /** DIVIDEND / DIVISOR. */
    RATIO_OF_FEATURES,
    /** Sum of coefficient times TERM feature. */
    LINEAR_COMBINATION_OF_FEATURES,
    /**
     * (1 - TIO5) / (1 - S(ARGUMENT)); S is the relation of quantity {@link Quantity#SOLAR_TIO5} of
     * the same paper.
     */
    METALLICITY_SHORTFALL;

    /**
     * Whether the form is made of other features instead of windows.
     *
     * @return true for sums, ratios and the like of features
     */
    public boolean isMadeOfFeatures() {
        return switch (this) {
            case SUM_OF_FEATURES,
                    RATIO_OF_FEATURES,
                    LINEAR_COMBINATION_OF_FEATURES,
                    METALLICITY_SHORTFALL ->
                    true;
            default -> false;
        };
    }

    /**
     * Whether the form gives an equivalent width.
     *
     * @return true for the three equivalent widths
     */
    public boolean isEquivalentWidth() {
        return switch (this) {
            case EQUIVALENT_WIDTH_LINEAR_CONTINUUM,
                    EQUIVALENT_WIDTH_MEAN_CONTINUUM,
                    EQUIVALENT_WIDTH_FITTED_CONTINUUM ->
                    true;
            default -> false;
        };
    }
}
