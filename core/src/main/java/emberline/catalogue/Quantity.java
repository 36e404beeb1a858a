package emberline.catalogue;

/** What a relation gives. */
public enum Quantity {
    /** Type number (subclass): M0 = 0, L0 = 10, T0 = 20, Y0 = 30. */
    SPECTRAL_TYPE,
    /** The TiO5 index of a star of solar metallicity. */
    SOLAR_TIO5,
    /** The CaH1 index below which a star is a subdwarf. */
    SUBDWARF_CAH1_LIMIT,
    /** [Fe/H] (dex). */
    IRON_ABUNDANCE
}
