package emberline.demo;

/** The formats in which the survey writes its spectra. */
enum FileFormat {
    /** Comma-separated values with a header line. */
    CSV,
    /** Plain text, columns separated by blanks, comments with {@code #}. */
    TEXT,
    /** Enhanced CSV with units. */
    ECSV,
    /** FITS image of the flux alone, wavelengths by keywords. */
    FITS_IMAGE,
    /** FITS image of the flux with the noise in an extension. */
    FITS_IMAGE_SIGMA,
    /** FITS image of three rows: wavelength, flux, sigma. */
    FITS_ROWS,
    /** FITS binary table. */
    FITS_TABLE,
    /** VOTable. */
    VOTABLE;

    /** What writes this format. */
    SpectrumFile file() {
        return switch (this) {
            case CSV -> new TextFile(",", false);
            case TEXT -> new TextFile(" ", false);
            case ECSV -> new TextFile(" ", true);
            case FITS_IMAGE, FITS_IMAGE_SIGMA -> new FitsImageFile();
            case FITS_ROWS -> new FitsRowsFile();
            case FITS_TABLE -> new TableFile(false);
            case VOTABLE -> new TableFile(true);
        };
    }
}
