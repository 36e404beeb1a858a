package emberline.catalogue;

/** What sort of number a feature is. */
public enum Kind {
    /** A number without unit, made of window means. */
    BAND_INDEX,
    /** An equivalent width (angstrom), positive in absorption. */
    EQUIVALENT_WIDTH
}
