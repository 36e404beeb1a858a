package emberline.catalogue;

/** How a number reached this catalogue, the best first. */
public enum HowKnown {
    /** Read in the paper itself. */
    READ_IN_SOURCE,
    /** Read in a later paper that quotes the first. */
    QUOTED_ELSEWHERE,
    /** Recalled, then tested against something independent. */
    CROSS_CHECKED,
    /** Computed or inferred from other known numbers. */
    DERIVED,
    /** Recalled; not verified at the source. */
    FROM_MEMORY
}
