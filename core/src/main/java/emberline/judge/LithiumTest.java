package emberline.judge;

/**
 * What is known of Li I 6708.
 *
 * @param outcome what was seen
 * @param limitAngstrom greatest equivalent width that could hide in the noise (angstrom); 0 where
 *     the line was not seen in a spectrum called good enough; not used otherwise
 * @param measured whether it was measured on a spectrum here, which noise can feign, or stated
 */
public record LithiumTest(Outcome outcome, double limitAngstrom, boolean measured) {

    /** What was seen. */
    public enum Outcome {
        /** The line is there. */
        SEEN,
        /** The line is not there, down to the limit. */
        NOT_SEEN,
        /** Nobody looked, or the spectrum does not allow it. */
        UNKNOWN
    }

    /**
     * Nothing is known.
     *
     * @return the test that was not made
     */
    public static LithiumTest unknown() {
        return new LithiumTest(Outcome.UNKNOWN, 0, false);
    }

    /**
     * The line was seen.
     *
     * @return a stated detection
     */
    public static LithiumTest seen() {
        return new LithiumTest(Outcome.SEEN, 0, false);
    }

    /**
     * The line was not seen.
     *
     * @param limitAngstrom greatest equivalent width that could hide (angstrom), not negative
     * @return a stated non-detection
     */
    public static LithiumTest notSeen(double limitAngstrom) {
        return new LithiumTest(Outcome.NOT_SEEN, limitAngstrom, false);
    }
}
