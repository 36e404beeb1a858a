package emberline.catalogue;

import java.util.OptionalDouble;

/**
 * A number that turns the equivalent width of H alpha into an activity.
 *
 * @param quantity what the number is
 * @param typeNumber the type for which it holds (subclass), M0 = 0, L0 = 10; empty: for all types
 * @param value the number, in the unit of its quantity
 * @param error its one-sigma error, same unit; empty: not known
 * @param source the paper
 * @param howKnown how the number reached this catalogue
 * @param confidencePercent how sure it is that it is exactly as printed, 0 to 100
 * @param note a remark; may be blank
 */
public record ActivityFactor(
        Quantity quantity,
        OptionalDouble typeNumber,
        double value,
        OptionalDouble error,
        Source source,
        HowKnown howKnown,
        int confidencePercent,
        String note) {

    /** What a number is. */
    public enum Quantity {
        /**
         * The flux density of the continuum beside H alpha over the bolometric flux (per angstrom):
         * times the equivalent width it gives L(H alpha) / L(bol).
         */
        CHI,
        /** The log10 of L(H alpha) / L(bol) at which chromospheres saturate. */
        SATURATION
    }

    /** Checks the numbers of a chi. */
    public ActivityFactor {
        if (quantity == Quantity.CHI && (typeNumber.isEmpty() || !(value > 0))) {
            throw new IllegalArgumentException(
                    "chi of " + value + ": expected a type number and a positive value");
        }
    }
}
