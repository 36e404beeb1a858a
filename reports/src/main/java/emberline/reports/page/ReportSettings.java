package emberline.reports.page;

/**
 * Settings of reports.
 *
 * @param paper size of the pages
 * @param programVersion version that stands in the provenance
 * @param seed start of the random draws, for the provenance
 */
public record ReportSettings(Paper paper, String programVersion, long seed) {

    /**
     * Reports on A4.
     *
     * @param programVersion version that stands in the provenance
     * @param seed start of the random draws, for the provenance
     * @return the settings
     */
    public static ReportSettings of(String programVersion, long seed) {
        return new ReportSettings(Paper.A4, programVersion, seed);
    }

    /**
     * These settings with other pages.
     *
     * @param size size of the pages
     * @return new settings
     */
    public ReportSettings withPaper(Paper size) {
        return new ReportSettings(size, programVersion, seed);
    }
}
