package emberline.measure;

/**
 * Settings of the measuring step.
 *
 * @param minCoverage least share of every window that good pixels must cover, above 0 up to 1
 * @param leastContinuumSignal least signal-to-noise of a continuum by which a feature divides
 */
public record Measuring(double minCoverage, double leastContinuumSignal) {

    private static final Measuring DEFAULTS = new Measuring(0.8, 3);

    /** Checks the ranges. */
    public Measuring {
        if (!(minCoverage > 0 && minCoverage <= 1)) {
            throw new IllegalArgumentException(
                    "coverage " + minCoverage + ": expected a share above 0 and up to 1");
        }
        if (!(leastContinuumSignal >= 0)) {
            throw new IllegalArgumentException(
                    "continuum signal " + leastContinuumSignal + ": expected at least 0");
        }
    }

    /**
     * The defaults: coverage 0.8, continuum at least 3 sigma.
     *
     * @return the settings
     */
    public static Measuring withDefaults() {
        return DEFAULTS;
    }

    /**
     * These settings with another coverage.
     *
     * @param share least share of every window, above 0 up to 1
     * @return new settings
     */
    public Measuring withMinCoverage(double share) {
        return new Measuring(share, leastContinuumSignal);
    }
}
