package emberline.catalogue;

/**
 * A region that the atmosphere of the Earth can spoil; its edges are soft by some 0.01 micron.
 *
 * @param cause the absorber, e.g. {@code H2O}
 * @param strength how badly it absorbs
 * @param window the region (micron, vacuum)
 * @param source where the region comes from
 * @param howKnown how it reached this catalogue
 * @param confidencePercent how sure it is, 0 to 100
 * @param note a remark; may be blank
 */
public record TelluricRegion(
        String cause,
        Strength strength,
        Window window,
        Source source,
        HowKnown howKnown,
        int confidencePercent,
        String note) {

    /** How badly a region absorbs, the worst first. */
    public enum Strength {
        /** Hardly any light comes through, at any site. */
        OPAQUE,
        /** Deep bands in any weather; correctable on most nights. */
        STRONG,
        /** Deep in wet weather, shallow at a dry site. */
        WET,
        /** Shallow. */
        WEAK
    }
}
