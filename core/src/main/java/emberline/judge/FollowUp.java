package emberline.judge;

/** Further observations that could be made of an object. */
public enum FollowUp {
    /** Li I 6708 in the optical. */
    LITHIUM,
    /** The K I lines in J. */
    POTASSIUM,
    /** The shape of the H band at a better signal-to-noise. */
    H_SHAPE,
    /** A low-resolution near-infrared spectrum. */
    LOW_RESOLUTION,
    /** A parallax. */
    PARALLAX,
    /** A radial velocity. */
    VELOCITY,
    /** CaH and TiO in the optical. */
    METALLICITY,
    /** Images sharp enough to part a pair. */
    IMAGING
}
