package emberline.catalogue;

/** What a window is to the form of its feature. */
public enum Role {
    /** Above the line of a ratio. */
    NUMERATOR,
    /** Below the line of a ratio. */
    DENOMINATOR,
    /** The line or band itself. */
    LINE,
    /** The first window of the continuum. */
    CONTINUUM_1,
    /** The second window of the continuum. */
    CONTINUUM_2,
    /** The third window of the continuum. */
    CONTINUUM_3,
    /** The fourth window of the continuum. */
    CONTINUUM_4,
    /** The first band of a normalised difference, counted positive. */
    BAND_A,
    /** The second band of a normalised difference, counted negative. */
    BAND_B,
    /** Above the line of the first ratio. */
    NUMERATOR_1,
    /** Below the line of the first ratio. */
    DENOMINATOR_1,
    /** Above the line of the second ratio. */
    NUMERATOR_2,
    /** Below the line of the second ratio. */
    DENOMINATOR_2,
    /** A factor of a product of powers. */
    FACTOR
}
