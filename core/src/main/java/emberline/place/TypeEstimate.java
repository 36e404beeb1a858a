package emberline.place;

import emberline.spectrum.SpectralType;

/**
 * A spectral type with its uncertainty, on the scale M0 = 0, L0 = 10, T0 = 20, Y0 = 30.
 *
 * @param typeNumber best value (subclass)
 * @param sigmaSubclass one-sigma uncertainty (subclass), positive
 * @param lo68 lower end of the 68% interval (subclass)
 * @param hi68 upper end of the 68% interval (subclass)
 * @param lo95 lower end of the 95% interval (subclass)
 * @param hi95 upper end of the 95% interval (subclass)
 */
public record TypeEstimate(
        double typeNumber,
        double sigmaSubclass,
        double lo68,
        double hi68,
        double lo95,
        double hi95) {

    /** Two-sided 95% point of a normal distribution, in units of its sigma. */
    private static final double NORMAL_95 = 1.959963984540054;

    /** Checks the order of the numbers. */
    public TypeEstimate {
        if (!(sigmaSubclass > 0)
                || !(lo95 <= lo68 && lo68 <= typeNumber && typeNumber <= hi68 && hi68 <= hi95)) {
            throw new IllegalArgumentException(
                    "type " + typeNumber + " +- " + sigmaSubclass + ": expected ordered intervals");
        }
    }

    /**
     * An estimate with normal errors.
     *
     * @param typeNumber best value (subclass)
     * @param sigmaSubclass one-sigma uncertainty (subclass), positive
     * @return the estimate with symmetric intervals
     */
    public static TypeEstimate normal(double typeNumber, double sigmaSubclass) {
        return new TypeEstimate(
                typeNumber,
                sigmaSubclass,
                typeNumber - sigmaSubclass,
                typeNumber + sigmaSubclass,
                typeNumber - NORMAL_95 * sigmaSubclass,
                typeNumber + NORMAL_95 * sigmaSubclass);
    }

    /**
     * The type as a value.
     *
     * @return the spectral type of the best value
     */
    public SpectralType type() {
        return new SpectralType(typeNumber);
    }

    /**
     * The code with the marks of doubt that are usual in the trade: one colon where the one-sigma
     * error exceeds one subclass, two where it exceeds two.
     *
     * @return for instance {@code L3.5} or {@code T2:}
     */
    public String code() {
        String mark = sigmaSubclass > 2 ? "::" : sigmaSubclass > 1 ? ":" : "";
        return type().code() + mark;
    }
}
