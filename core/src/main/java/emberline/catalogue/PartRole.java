package emberline.catalogue;

/** What a part is to the form of a feature that is made of features. */
public enum PartRole {
    /** A term of a sum. */
    TERM,
    /** Above the line of a ratio. */
    DIVIDEND,
    /** Below the line of a ratio. */
    DIVISOR,
    /** The TiO5 index of a metallicity shortfall. */
    TIO5,
    /** The index on which the solar TiO5 curve depends. */
    ARGUMENT
}
