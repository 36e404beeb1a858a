package emberline.catalogue;

/**
 * The limits of a gravity score in one index at one type.
 *
 * @param feature id of the feature
 * @param typeNumber type (subclass): M0 = 0, L0 = 10
 * @param intermediate value from which on the index scores as intermediate gravity
 * @param veryLow value from which on the index scores as very low gravity
 * @param lowGravityIf on which side of the limits gravity is low
 * @param source the paper
 * @param howKnown how the limits reached this catalogue
 * @param confidencePercent how sure it is that they are exactly as printed, 0 to 100
 * @param note a remark; may be blank
 */
public record GravityThreshold(
        String feature,
        double typeNumber,
        double intermediate,
        double veryLow,
        LowGravityIf lowGravityIf,
        Source source,
        HowKnown howKnown,
        int confidencePercent,
        String note) {

    /** On which side of a limit gravity is low; the limit itself belongs to low gravity. */
    public enum LowGravityIf {
        /** Low gravity makes the index smaller. */
        BELOW,
        /** Low gravity makes the index larger. */
        ABOVE
    }

    /** Checks that the limit of very low gravity lies beyond the other. */
    public GravityThreshold {
        double beyond =
                lowGravityIf == LowGravityIf.BELOW
                        ? intermediate - veryLow
                        : veryLow - intermediate;
        if (!(beyond > 0)) {
            throw new IllegalArgumentException(
                    feature
                            + " at type "
                            + typeNumber
                            + ": expected the limit of very low gravity "
                            + veryLow
                            + " beyond that of intermediate gravity "
                            + intermediate);
        }
    }
}
