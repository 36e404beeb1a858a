package emberline.measure;

/**
 * Settings of the measuring step.
 *
 * @param minCoverage least share of every window that good pixels must cover, above 0 up to 1
 * @param leastContinuumSignal least signal-to-noise of a continuum by which a feature divides
 * @param site from where the objects were observed
 */
public record Measuring(double minCoverage, double leastContinuumSignal, Site site) {

    private static final Measuring DEFAULTS = new Measuring(0.8, 3, Site.DRY);

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
     * The defaults: coverage 0.8, continuum at least 3 sigma, a dry site.
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
        return new Measuring(share, leastContinuumSignal, site);
    }

    /**
     * These settings with another site.
     *
     * @param from where the objects were observed
     * @return new settings
     */
    public Measuring withSite(Site from) {
        return new Measuring(minCoverage, leastContinuumSignal, from);
    }

    /**
     * These settings with another demand on the continuum.
     *
     * @param least least signal-to-noise of a continuum, at least 0
     * @return new settings
     */
    public Measuring withLeastContinuumSignal(double least) {
        return new Measuring(minCoverage, least, site);
    }
}
