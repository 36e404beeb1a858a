package emberline.catalogue;

import java.util.OptionalDouble;

/**
 * The range of an index that a subclass takes up.
 *
 * @param feature id of the feature
 * @param typeNumber type (subclass): M0 = 0, L0 = 10, T0 = 20
 * @param low least index of the subclass; empty: open
 * @param high greatest index of the subclass; empty: open
 * @param source the paper
 * @param howKnown how the range reached this catalogue
 * @param confidencePercent how sure it is that the range is exactly as printed, 0 to 100
 * @param note a remark; may be blank
 */
public record TypeBoundary(
        String feature,
        double typeNumber,
        OptionalDouble low,
        OptionalDouble high,
        Source source,
        HowKnown howKnown,
        int confidencePercent,
        String note) {

    /** Checks the order of the limits. */
    public TypeBoundary {
        boolean open = low.isEmpty() || high.isEmpty();
        if (!open && !(low.getAsDouble() < high.getAsDouble())) {
            throw new IllegalArgumentException(
                    feature + " at type " + typeNumber + ": expected low below high");
        }
    }
}
