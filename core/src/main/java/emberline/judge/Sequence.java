package emberline.judge;

/** Sequences of objects for which relations with the spectral type differ. */
enum Sequence {
    /** Objects of field gravity. */
    FIELD,
    /** Objects of low gravity and members of young groups. */
    YOUNG,
    /** Intermediate gravity alone. */
    INT_G,
    /** Very low gravity alone. */
    VL_G
}
