package emberline.measure;

/**
 * Settings of the measuring step.
 *
 * @param minCoverage least share of every window that good pixels must cover, above 0 up to 1; an
 *     equivalent width needs 0.97 of the window of its line or more
 * @param leastContinuumSignal least signal-to-noise of a continuum by which a feature divides; a
 *     continuum whose true signal is 5 or more is hardly ever refused at the default of 3, and its
 *     68% intervals hold 66% to 70%. One with a true signal of 2 to 3 is refused in two of three
 *     spectra, and in the third, where the noise has lifted it, intervals hold 60%
 * @param site from where the objects were observed
 */
public record Measuring(double minCoverage, double leastContinuumSignal, Site site) {

    /**
     * Least share of the window of a line that good pixels must cover for an equivalent width,
     * unless {@code minCoverage} asks for more. A width is an integral, and a gap is filled as if
     * the line went on there as on average: with 18% of a window missing, a width of 3.8 angstrom
     * was found as 4.5, far beyond its error. A missing 3% changes a width by about 3% at most. The
     * continuum is a mean, and {@code minCoverage} is enough for it.
     */
    static final double LEAST_LINE_COVERAGE = 0.97;

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
