package emberline.catalogue;

/** How a feature answers to what it measures. */
public enum Sense {
    /** Smaller where the band or line is deeper. */
    FALLS_WITH_ABSORPTION,
    /** Larger where the band or line is deeper. */
    RISES_WITH_ABSORPTION,
    /** Larger where the line is in emission. */
    RISES_WITH_EMISSION,
    /** Follows a slope or the shape of a peak. */
    CONTINUUM_SHAPE,
    /** Not known. */
    UNSTATED
}
