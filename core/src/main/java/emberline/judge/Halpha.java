package emberline.judge;

/** What H alpha shows. */
public enum Halpha {
    /** Not observed, or the limit is no use. */
    UNKNOWN,
    /** Emission at or above the saturation of chromospheres: accretion or a flare. */
    ABOVE_SATURATION,
    /** Emission. */
    EMISSION,
    /** No emission in a spectrum where it would be seen. */
    NO_EMISSION
}
