package emberline.catalogue;

/** What a feature or line is good for. */
public enum Purpose {
    /** The spectral type. */
    TYPE,
    /** The surface gravity. */
    GRAVITY,
    /** The metallicity. */
    METALLICITY,
    /** Dwarf against giant. */
    LUMINOSITY,
    /** An unresolved pair of dwarfs. */
    BINARITY,
    /** Chromosphere or accretion. */
    ACTIVITY,
    /** The age: lithium. */
    AGE,
    /** A colour; for checks, not for types. */
    COLOUR,
    /** The kind of object; says nothing alone. */
    KIND
}
